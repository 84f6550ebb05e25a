/**
 * A number with its technical error, kept apart by where the error comes from, so that sums over
 * samples can add what is independent in quadrature and what is shared linearly.
 */
export interface Quantity {
  value: number | null;
  standardError: number | null;
  lower: number | null;
  upper: number | null;
}

/** Errors that everything from one suspension shares, in the unit of the value; they add linearly. */
export interface SharedErrors {
  suspensionVolume: number;
  dilution: number;
  chamberVolume: number;
}

export interface Uncertain {
  value: number;
  /** Variance of the independent part; NaN where it is undefined (no nucleus was counted). */
  variance: number;
  /** Distance from the value down and up to the 95 % limits of the independent part. */
  below: number;
  above: number;
  shared: SharedErrors;
}

/** What is printed where a quantity is undefined: every member null. */
export const UNDEFINED_QUANTITY: Quantity = { value: null, standardError: null, lower: null, upper: null };

/** The 97.5 % point of the standard normal distribution. */
export const NORMAL_975 = 1.959963984540054;

export const NO_SHARED_ERRORS: SharedErrors = { suspensionVolume: 0, dilution: 0, chamberVolume: 0 };

/** Returns the number itself, or null where it is NaN or infinite: no such number leaves this folder. */
export function finiteOrNull(value: number | null | undefined): number | null {
  return value !== null && value !== undefined && Number.isFinite(value) ? value : null;
}

function scaleShared(shared: SharedErrors, factor: number): SharedErrors {
  return {
    suspensionVolume: shared.suspensionVolume * factor,
    dilution: shared.dilution * factor,
    chamberVolume: shared.chamberVolume * factor,
  };
}

function sharedVariance(shared: SharedErrors): number {
  return shared.suspensionVolume ** 2 + shared.dilution ** 2 + shared.chamberVolume ** 2;
}

/**
 * Multiplies an uncertain number by a factor with its own independent standard error.
 * Var(f·T) = f²Var(T) + T²Var(f) + Var(f)Var(T); limits combine as squares of distances.
 */
export function scaleBy(quantity: Uncertain, factor: number, factorSe = 0): Uncertain {
  const spread = NORMAL_975 * quantity.value * factorSe;
  return {
    value: quantity.value * factor,
    variance: factor ** 2 * quantity.variance + quantity.value ** 2 * factorSe ** 2 + factorSe ** 2 * quantity.variance,
    below: Math.hypot(quantity.below * factor, spread),
    above: Math.hypot(quantity.above * factor, spread),
    shared: scaleShared(quantity.shared, factor),
  };
}

/**
 * Multiplies a count T by a fraction p: Var(p·T) = T²Var(p) + p²Var(T) + Var(p)Var(T) (Goodman 1960).
 * Limits: distances to the limits of each, combined as squares (Zou & Donner 2008).
 */
export function takeFraction(
  count: Uncertain,
  fraction: { value: number; variance: number; lower: number; upper: number },
): Uncertain {
  const { value: p, variance: varP } = fraction;
  return {
    value: count.value * p,
    variance: count.value ** 2 * varP + p ** 2 * count.variance + varP * (count.variance + sharedVariance(count.shared)),
    below: Math.hypot(count.below * p, count.value * (p - fraction.lower)),
    above: Math.hypot(count.above * p, count.value * (fraction.upper - p)),
    shared: scaleShared(count.shared, p),
  };
}

/**
 * Adds uncertain numbers: independent parts in quadrature; the shared errors of members that carry
 * the same suspension key linearly, those of different suspensions in quadrature.
 *
 * Members without a key (null) share with nobody.
 */
export function addUncertain(members: readonly { quantity: Uncertain; suspensionKey: string | null }[]): Uncertain {
  const bySuspension = new Map<string, SharedErrors>();
  const total: Uncertain = { value: 0, variance: 0, below: 0, above: 0, shared: { ...NO_SHARED_ERRORS } };
  members.forEach(({ quantity, suspensionKey }, index) => {
    total.value += quantity.value;
    total.variance += quantity.variance;
    total.below = Math.hypot(total.below, quantity.below);
    total.above = Math.hypot(total.above, quantity.above);
    const key = suspensionKey === null ? `alone ${index}` : `suspension ${suspensionKey}`;
    const sum = bySuspension.get(key) ?? { ...NO_SHARED_ERRORS };
    sum.suspensionVolume += quantity.shared.suspensionVolume;
    sum.dilution += quantity.shared.dilution;
    sum.chamberVolume += quantity.shared.chamberVolume;
    bySuspension.set(key, sum);
  });
  for (const sum of bySuspension.values()) {
    total.shared.suspensionVolume = Math.hypot(total.shared.suspensionVolume, sum.suspensionVolume);
    total.shared.dilution = Math.hypot(total.shared.dilution, sum.dilution);
    total.shared.chamberVolume = Math.hypot(total.shared.chamberVolume, sum.chamberVolume);
  }
  return total;
}

/**
 * The form in which a quantity leaves: value, standard error and 95 % limits, null where undefined.
 * A lower limit below zero is given as zero, because no count is negative.
 */
export function toQuantity(quantity: Uncertain | null): Quantity {
  const value = finiteOrNull(quantity?.value);
  if (quantity === null || value === null) return { ...UNDEFINED_QUANTITY };
  const shared = NORMAL_975 * Math.sqrt(sharedVariance(quantity.shared));
  const lower = finiteOrNull(quantity.value - Math.hypot(quantity.below, shared));
  return {
    value,
    standardError: finiteOrNull(Math.sqrt(quantity.variance + sharedVariance(quantity.shared))),
    lower: lower === null ? null : Math.max(0, lower),
    upper: finiteOrNull(quantity.value + Math.hypot(quantity.above, shared)),
  };
}
