import type { StripEvent } from '../../shared/engine/events';

/** A measure over the events of one strip, in the vocabulary of tests/fixtures/timing-cases.json. */
export interface TimingAssertion {
  measure: string;
  of: string;
  to?: string;
  per?: string;
  where?: Record<string, unknown>;
  toWhere?: Record<string, unknown>;
  match?: Record<string, unknown>;
  within?: [number, number];
  direction?: 'after' | 'before';
  maxMs?: number;
  reduce?: 'longest' | 'shortest' | 'mean' | 'median' | 'first' | 'last';
  field?: string;
  afterS?: number;
  beforeS?: number;
  atS?: number;
  equals?: number;
  min?: number;
  max?: number;
  pattern?: (number | string)[];
  set?: unknown[];
  toleranceMs?: number;
  tolerance?: number;
  why?: string;
  source?: string;
}

export interface TimingCase {
  id: string;
  title: string;
  parameters: unknown;
  assertions: TimingAssertion[];
}

type Fields = Record<string, unknown>;

function nameOf(event: StripEvent): string {
  return event.type === 'marker' ? event.code : event.chamber;
}

function selects(selector: string, event: StripEvent): boolean {
  const [type, names = '*'] = selector.split(':');
  return event.type === type && (names === '*' || names.split('|').includes(nameOf(event)));
}

/** Equality of fields; an array means any of its members; a missing field equals false. */
function matches(where: Fields | undefined, event: StripEvent): boolean {
  return Object.entries(where ?? {}).every(([key, wanted]) => {
    const value = (event as unknown as Fields)[key] ?? false;
    return Array.isArray(wanted) ? wanted.includes(value) : value === wanted;
  });
}

function pick(
  events: readonly StripEvent[],
  selector: string,
  where: Fields | undefined,
  within: [number, number] | undefined,
): StripEvent[] {
  return events.filter(
    (event) =>
      selects(selector, event) &&
      matches(where, event) &&
      (!within || (event.timeS >= within[0] && event.timeS < within[1])),
  );
}

function intervalsMs(events: readonly StripEvent[]): number[] {
  return events.slice(1).map((event, i) => 1000 * (event.timeS - events[i].timeS));
}

/** Nearest partner of each `of` event, ms; null without one within `maxMs`. */
function partnerDelays(assertion: TimingAssertion, of: StripEvent[], to: StripEvent[]): (number | null)[] {
  const { direction = 'after', maxMs = 1000 } = assertion;
  return of.map((event) => {
    const partner =
      direction === 'after'
        ? to.find((other) => other !== event && other.timeS >= event.timeS)
        : to.findLast((other) => other.timeS < event.timeS);
    if (!partner) return null;
    const delay = 1000 * Math.abs(partner.timeS - event.timeS);
    return delay <= maxMs ? delay : null;
  });
}

function reduced(values: number[], how: TimingAssertion['reduce']): number[] {
  if (!how || values.length === 0) return values;
  const sorted = [...values].sort((a, b) => a - b);
  switch (how) {
    case 'longest':
      return [sorted[sorted.length - 1]];
    case 'shortest':
      return [sorted[0]];
    case 'mean':
      return [values.reduce((sum, value) => sum + value, 0) / values.length];
    case 'median':
      return [sorted[Math.floor(sorted.length / 2)]];
    case 'first':
      return [values[0]];
    case 'last':
      return [values[values.length - 1]];
  }
}

/** Whether values are a run of the endlessly repeated pattern, from any starting point. */
function isRunOf<T>(values: readonly T[], pattern: readonly T[], same: (a: T, b: T) => boolean): boolean {
  return pattern.some((_, start) =>
    values.every((value, i) => same(value, pattern[(start + i) % pattern.length])),
  );
}

const inMs = new Set(['intervalMs', 'delayMs', 'firstAfterMs', 'lastBeforeMs', 'gapAcrossMs']);

function expectNumbers(assertion: TimingAssertion, values: number[]): string | null {
  const tolerance = inMs.has(assertion.measure)
    ? (assertion.toleranceMs ?? 2)
    : (assertion.tolerance ?? assertion.toleranceMs ?? 0);
  if (values.length === 0) return 'nothing to measure';
  const { equals, min, max } = assertion;
  if (equals === undefined && min === undefined && max === undefined) return 'no expectation';
  const bad = values.filter(
    (value) =>
      (equals !== undefined && Math.abs(value - equals) > tolerance + 1e-9) ||
      (min !== undefined && value < min - tolerance - 1e-9) ||
      (max !== undefined && value > max + tolerance + 1e-9),
  );
  return bad.length === 0
    ? null
    : `got ${bad
        .slice(0, 5)
        .map((value) => value.toFixed(3))
        .join(', ')}`;
}

function edgeTimes(assertion: TimingAssertion, of: StripEvent[]): number[] {
  const { measure, afterS = 0, beforeS = 0, atS = 0 } = assertion;
  const first = (from: number) => of.find((event) => event.timeS >= from)?.timeS;
  const last = (before: number) => of.findLast((event) => event.timeS < before)?.timeS;
  const pair: [number | undefined, number | undefined] =
    measure === 'firstAfterMs'
      ? [afterS, first(afterS)]
      : measure === 'lastBeforeMs'
        ? [last(beforeS), beforeS]
        : [last(atS), first(atS)];
  return pair[0] === undefined || pair[1] === undefined ? [] : [1000 * (pair[1] - pair[0])];
}

function followedShare(assertion: TimingAssertion, of: StripEvent[], to: StripEvent[], durationS: number) {
  const { maxMs = 1000, direction = 'after' } = assertion;
  const inside = of.filter((event) =>
    direction === 'after' ? event.timeS + maxMs / 1000 <= durationS : event.timeS >= maxMs / 1000,
  );
  const delays = partnerDelays(assertion, inside, to);
  return inside.length === 0 ? [] : [delays.filter((delay) => delay !== null).length / inside.length];
}

/**
 * Checks one assertion on the events of a strip.
 *
 * @returns null when it holds, otherwise what was found
 */
export function checkTimingAssertion(
  assertion: TimingAssertion,
  events: readonly StripEvent[],
  durationS: number,
): string | null {
  const { measure, within, where } = assertion;
  const of = pick(events, assertion.of, where, within);
  const to = assertion.to ? pick(events, assertion.to, assertion.toWhere, undefined) : [];
  const numbers = (values: number[]) => expectNumbers(assertion, reduced(values, assertion.reduce));
  const delays = () => partnerDelays(assertion, of, to).filter((delay) => delay !== null);
  const cycle = (values: number[]): string | null => {
    if (values.length === 0) return 'nothing to measure';
    const pattern = (assertion.pattern ?? []) as number[];
    const tolerance = assertion.toleranceMs ?? 2;
    const run = isRunOf(values, pattern, (a, b) => Math.abs(a - b) <= tolerance + 1e-9);
    return run
      ? null
      : `got ${values
          .slice(0, 12)
          .map((value) => value.toFixed(1))
          .join(', ')}`;
  };
  switch (measure) {
    case 'intervalMs':
      return numbers(intervalsMs(of));
    case 'delayMs':
      return numbers(delays());
    case 'cycle':
      return cycle(intervalsMs(of));
    case 'delayCycle':
      return cycle(delays());
    case 'count':
      return numbers([of.length]);
    case 'ratePerMinute':
      return numbers(of.length < 2 ? [] : [60_000 / reduced(intervalsMs(of), 'mean')[0]]);
    case 'ratio': {
      const per = pick(events, assertion.per ?? '', undefined, within);
      return numbers(per.length === 0 ? [] : [of.length / per.length]);
    }
    case 'share':
      return numbers(
        of.length === 0 ? [] : [of.filter((event) => matches(assertion.match, event)).length / of.length],
      );
    case 'followedShare':
      return numbers(followedShare(assertion, of, to, durationS));
    case 'sequence': {
      const names = of.map(nameOf);
      if (names.length === 0) return 'nothing to measure';
      const run = isRunOf(names, assertion.pattern as string[], (a, b) => a === b);
      return run ? null : `got ${names.slice(0, 12).join(', ')}`;
    }
    case 'values': {
      const field = assertion.field ?? '';
      const found = new Set(of.map((event) => (event as unknown as Fields)[field] ?? null));
      if (of.length === 0) return 'nothing to measure';
      const wanted = new Set(assertion.set);
      const same = found.size === wanted.size && [...found].every((value) => wanted.has(value));
      return same ? null : `got ${[...found].join(', ')}`;
    }
    case 'firstAfterMs':
    case 'lastBeforeMs':
    case 'gapAcrossMs':
      return numbers(edgeTimes(assertion, of));
    default:
      return `unknown measure ${measure}`;
  }
}
