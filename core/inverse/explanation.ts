import type { SolveResult } from '../wire/inverse.ts'

const shown = (value: number): string => String(Number(value.toPrecision(4)))

/** Why an inverse question has no answer, in words; null when it has one. */
export function explanationOf(
  path: string,
  { solutions, searched, targetOmegaH2, lowest, highest, leaps, gaps }: Omit<SolveResult, 'explanation'>,
): string | null {
  if (solutions.length > 0) return null
  const where = `between ${shown(searched[0])} and ${shown(searched[1])}`
  return [mainReason(path, where, { targetOmegaH2, lowest, highest, leaps }), ...gaps.map(gapWords)].join(' ')
}

function mainReason(
  path: string,
  where: string,
  {
    targetOmegaH2: target,
    lowest,
    highest,
    leaps,
  }: Pick<SolveResult, 'targetOmegaH2' | 'lowest' | 'highest' | 'leaps'>,
): string {
  if (leaps.length > 0)
    return `The abundance leaps over the target at ${path} = ${leaps.map(shown).join(', ')}, where something steps: no value gives it.`
  if (lowest.omegaH2 > target)
    return `Everywhere ${where} there is more than the target; least, ${shown(lowest.omegaH2)}, at ${shown(lowest.value)}.`
  if (highest.omegaH2 < target)
    return `Everywhere ${where} there is less than the target; most, ${shown(highest.omegaH2)}, at ${shown(highest.value)}.`
  return `The target lies between abundances that are parted by values ${where} without one.`
}

const gapWords = ({ from, to, message }: SolveResult['gaps'][number]): string =>
  from === to
    ? `At ${shown(from)} there is no abundance: ${message}.`
    : `From ${shown(from)} to ${shown(to)} there is no abundance: ${message}.`
