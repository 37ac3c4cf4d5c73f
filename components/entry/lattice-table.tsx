import { ScenarioLattice } from '@/components/charts/scenario-lattice';
import { type Forecast } from '@/journal/forecast/forecast';

interface Props {
  readonly forecast: Pick<Forecast, 'lattice' | 'ends'>;
  readonly currency: string;
}

/** Profit by move and sessions elapsed, as the plan has it. */
export function LatticeTable({ forecast: { lattice, ends }, currency }: Props) {
  const profits = lattice.profit.flat();
  return (
    <ScenarioLattice
      rows={lattice.rows}
      columns={lattice.sessionsElapsed.map((sessions) => ({
        label: sessions === 0 ? 'now' : String(Number(sessions.toFixed(1))),
      }))}
      profit={lattice.profit}
      likelihood={lattice.likelihood}
      current={[lattice.rows.findIndex((row) => row.sigma === 0), 0]}
      largestLoss={Math.abs(ends.greatestLoss ?? Math.min(...profits))}
      largestGain={Math.abs(ends.greatestGain ?? Math.max(...profits))}
      unit={currency}
    />
  );
}
