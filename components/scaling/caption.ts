import type { ScalingAnswer } from '../../shared/contracts/fits';
import type { FigureCaption } from '../charts/figureSvg';
import { formatExponent, formatInterval } from '../../shared/domain/quantityText';
import type { CladeResult } from './figureGroups';
import type { ScalingChoice } from './scalingChoice';
import { questionTitle } from './variables';

/** "43 species means, 42 fitted. Dotted: constant density." */
export function countsLine(results: readonly CladeResult[], hasDiagonals: boolean): string {
  const fitted = new Set(results.flatMap((result) => result.fitted.map(({ species }) => species.slug)));
  const aside = new Set(results.flatMap((result) => result.aside.map(({ slug }) => slug)));
  const all = new Set([...fitted, ...aside]).size;
  return `${all} species means, ${fitted.size} fitted.${aside.size > 0 ? ' Hollow: left out of the fit.' : ''}${hasDiagonals ? ' Dotted: constant density.' : ''}`;
}

export const methodWords: Readonly<Record<string, string>> = { ols: 'least squares', sma: 'standardised major axis' };

/** Caption of a saved figure: what is shown with every exponent, what is left out, the version and its citation. */
export function figureCaption(answer: ScalingAnswer, results: readonly CladeResult[], choice: ScalingChoice, options: { citation: string | null; hasDiagonals: boolean; address: string }): FigureCaption {
  const percent = `${Number((answer.question.level * 100).toPrecision(3))} %`;
  const exponents = results.flatMap(({ name, fit }) =>
    fit.exponent ? [`${name} ${formatExponent(fit.exponent.estimate)} (${formatInterval(fit.exponent.lower, fit.exponent.upper)}, n = ${fit.n})`] : [`${name}: no line, n = ${fit.n}`],
  );
  const bands = choice.method === 'ols' ? [choice.confidence ? 'confidence band' : null, choice.prediction ? 'prediction band' : null].filter((band) => band !== null) : [];
  const aside = results.flatMap((result) => result.aside.map(({ species }) => species));
  return {
    title: questionTitle(answer.question),
    lines: [
      countsLine(results, options.hasDiagonals),
      `Exponents by ${methodWords[answer.question.method] ?? answer.question.method} on log–log axes with their ${percent} intervals: ${exponents.join('; ')}.${bands.length > 0 ? ` Shaded: ${bands.join(' and ')}, ${percent}.` : ''}`,
      ...(aside.length > 0 ? [`Left out of the fit: ${aside.join(', ')}.`] : []),
      ...(answer.demonstration ? ['Holds demonstration data.'] : []),
      choice.working ? 'Working set, not frozen: not to be cited.' : (options.citation ?? `Allokarya, version ${answer.version}.`),
      options.address,
    ],
  };
}

/** File name without extension: question, clades and version. */
export function fileNameOf(answer: ScalingAnswer): string {
  const { y, yStructure, x, xStructure, method } = answer.question;
  const part = (variable: string, structure: string | null) => [variable.toLowerCase(), structure?.replaceAll('_', '-')].filter(Boolean).join('-');
  return ['allokarya', answer.version === 'working' ? 'working-set' : `v${answer.version}`, part(y, yStructure), 'on', part(x, xStructure), method].join('-');
}
