import { sampleSizeRule, type SampleRule } from '@/journal/scoring/sample-size-rule';

export interface Sampled<Figures> {
  readonly count: number;
  readonly sampleRule: SampleRule;
  readonly figures: Figures | null;
}

/** How much may be said of how many cases. */
export interface SampleOptions {
  /** The sums of small samples too: they were asked for by name. */
  readonly evenIfFew: boolean;
}

/** The one place that decides whether figures of so many cases are made at all. */
export function sampled<Figures>(
  count: number,
  { evenIfFew }: SampleOptions,
  figures: () => Figures,
): Sampled<Figures> {
  const sampleRule = sampleSizeRule(count);
  const isSaid = count > 0 && (sampleRule !== 'list-only' || evenIfFew);
  return { count, sampleRule, figures: isSaid ? figures() : null };
}
