import type { CheckResult } from '../../contracts/checks';
import { outcome } from './outcome';

export interface DatedAct {
  path: string;
  text: string;
  /** As it stands in a sentence: "death". */
  act: string;
}

/** Whether a text is a year or a day of the calendar in ISO form. */
export function isDate(text: string): boolean {
  if (/^\d{4}$/.test(text)) return true;
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  const parsed = new Date(`${text}T00:00:00Z`);
  // 31 June would roll over to July and print differently.
  return !Number.isNaN(parsed.getTime()) && parsed.toISOString().slice(0, 10) === text;
}

/** Whether `a` is later than `b`; a year alone is compared by the year. */
export function isLater(a: string, b: string): boolean {
  const length = Math.min(a.length, b.length);
  return a.slice(0, length) > b.slice(0, length);
}

/**
 * Dates are days of the calendar, not in the future, and in the order of the acts given
 * (death → fixation → count). Empty dates are passed over.
 */
export function checkDates(acts: readonly DatedAct[], today: string): CheckResult[] {
  const results: CheckResult[] = [];
  const dated = acts.map((act) => ({ ...act, text: act.text.trim() })).filter((act) => act.text !== '');
  const readable = dated.filter((act) => {
    if (isDate(act.text)) return true;
    results.push(outcome('blocks', 'date-malformed', act.path, `The date of ${act.act} is written as year-month-day, or as a year.`, act.text, 'YYYY-MM-DD'));
    return false;
  });
  readable.forEach((act, i) => {
    if (isLater(act.text, today)) {
      results.push(outcome('blocks', 'date-in-the-future', act.path, `The date of ${act.act} lies in the future.`, act.text, `≤ ${today}`));
    }
    const earlier = readable.slice(0, i).find((before) => before.act !== act.act && isLater(before.text, act.text));
    if (earlier) {
      results.push(outcome('blocks', 'dates-out-of-order', act.path, `The ${act.act} is dated before the ${earlier.act}.`, act.text, `≥ ${earlier.text}`));
    }
  });
  return results;
}
