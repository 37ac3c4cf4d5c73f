import { readTypedNumber } from '@/shared/entries/typed-number';

export interface PlanProblem {
  /** A path in the draft, such as `legs.0.strikePrice`; empty for the whole plan. */
  readonly field: string;
  /** What is wrong and what to do, one sentence each. */
  readonly message: string;
}

export type Report = (field: string, message: string) => void;

export interface NumberRule {
  readonly name: string;
  readonly least?: number;
  readonly above?: number;
  readonly most?: number;
  readonly whole?: boolean;
}

/** The number in a field, or null after reporting what is wrong with it. */
export function readNumber(report: Report, field: string, text: string, rule: NumberRule): number | null {
  const value = readTypedNumber(text);
  if (value === null) {
    report(
      field,
      text.trim() === ''
        ? `${rule.name} is missing. Type a number.`
        : `${rule.name} is not a number. Write it like 12.5.`,
    );
    return null;
  }
  if (rule.whole === true && !Number.isInteger(value)) report(field, `${rule.name} must be a whole number.`);
  else if (rule.above !== undefined && !(value > rule.above))
    report(field, `${rule.name} must be above ${rule.above}.`);
  else if (rule.least !== undefined && !(value >= rule.least))
    report(field, `${rule.name} must be ${rule.least} or more.`);
  else if (rule.most !== undefined && !(value <= rule.most))
    report(field, `${rule.name} must be ${rule.most} or less.`);
  else return value;
  return null;
}
