import { type DraftPlan } from '@/shared/entries/draft-plan';
import { type DeskSettings } from '@/shared/desk/desk-settings';

/** Percent text of a fraction without binary noise: 0.04 becomes '4'. */
function percentText(fraction: number): string {
  return String(Number((fraction * 100).toPrecision(12)));
}

/** An empty plan on an underlying with the desk's presets: 21 returns, to expiry, zero expected return. */
export function newDraftPlan(underlyingId: string, settings: DeskSettings): DraftPlan {
  return {
    underlyingId,
    spotPrice: '',
    spotAt: '',
    legs: [],
    holding: 'toExpiry',
    holdingSessions: '',
    volatility: { source: 'window', window: 21, lowPercent: '', basePercent: '', highPercent: '', reason: '' },
    drift: { kind: 'zeroReturn', expectedReturnPercent: '', reason: '' },
    ratePercent: percentText(settings.ratePerYear),
    overnightSharePercent: percentText(settings.overnightShare),
    feePerContract: settings.feePerContract,
    targetPrice: '',
    stopPrice: '',
    idea: '',
    exitRule: '',
    tags: [],
  };
}
