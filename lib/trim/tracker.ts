import { normalCdf } from '../search/normal-distribution';
import type { OutputState } from '../search/types';

/**
 * Follows a moving trip point from single looks at the output: a particle filter of (trip, rate, error of the hysteresis),
 * with a still and a moving mode, after the bootstrap filter of Gordon, Salmond and Smith (1993). Deterministic: its random
 * numbers come from a seed inside the state.
 */
export interface Tracker extends Particles {
  trip: TrackedTrip;
  atMs: number;
  seed: number;
}

/** Median trip point with its standard deviation, and the share of particles that move. */
export interface TrackedTrip {
  volts: number;
  sdVolts: number;
  movingShare: number;
}

interface Particles {
  /** Volts; volts a second, 0 while still; volts. */
  trips: Float64Array;
  rates: Float64Array;
  hysteresisErrors: Float64Array;
}

export interface TrackerModel {
  /** Fastest trip point expected, volts a second; and the sign that was asked for. */
  briskVoltsPerSecond: number;
  askedSign: number;
  noiseVolts: number;
  overshoot: number;
  hysteresisVolts: number;
}

/** What was looked at: the supply went from one place to another, and the output was so before and after. */
export interface TrackerLook {
  fromVolts: number;
  volts: number;
  before: OutputState;
  after: OutputState;
  atMs: number;
}

const particles = 400;
/** Mean times until a still hand turns and a turning one rests, and the pull of the rate's wander a second. */
const startSeconds = 1.5;
const restSeconds = 0.7;
const rateWander = 0.8;
/** Share of starts against the way asked. */
const contraryShare = 0.15;
/** Any seed will do; a fixed one makes every run repeat. */
const firstSeed = 0x2545f491;
/** An outcome that the model did not foresee still has this likelihood. */
const surprise = 0.01;

export function beginTracker(tripVolts: number, sdVolts: number, hysteresisSdVolts: number, atMs: number): Tracker {
  const tracker: Particles = {
    trips: new Float64Array(particles),
    rates: new Float64Array(particles),
    hysteresisErrors: new Float64Array(particles),
  };
  const random = generator(firstSeed);
  for (let i = 0; i < particles; i++) {
    tracker.trips[i] = tripVolts + sdVolts * random.normal();
    tracker.hysteresisErrors[i] = hysteresisSdVolts * random.normal();
  }
  return { ...tracker, trip: summarise(tracker), atMs, seed: random.seed() };
}

/** The filter after one look: moved on in time, weighed by the outcome, drawn anew. */
export function track(tracker: Tracker, model: TrackerModel, look: TrackerLook): Tracker {
  const next: Particles = {
    trips: tracker.trips.slice(),
    rates: tracker.rates.slice(),
    hysteresisErrors: tracker.hysteresisErrors.slice(),
  };
  const random = generator(tracker.seed);
  drift(next, model, Math.max(0, look.atMs - tracker.atMs) / 1000, random);
  const drawn = redraw(next, weigh(next, model, look), random);
  return { ...drawn, trip: summarise(drawn), atMs: look.atMs, seed: random.seed() };
}

function summarise({ trips, rates }: Particles): TrackedTrip {
  const volts = trips.slice().sort()[particles >> 1]!;
  let moving = 0;
  let squares = 0;
  for (let i = 0; i < particles; i++) {
    if (rates[i] !== 0) moving++;
    squares += (trips[i]! - volts) ** 2;
  }
  return { volts, sdVolts: Math.sqrt(squares / particles), movingShare: moving / particles };
}

/** Median release point, for a look from the off side. */
export function trackedRelease(tracker: Tracker, hysteresisVolts: number): number {
  const releases = tracker.trips.map((trip, i) => trip + hysteresisVolts + tracker.hysteresisErrors[i]!).sort();
  return releases[particles >> 1]!;
}

/** In place. The hysteresis wanders a little, lest a chance of the turn stays in it. */
function drift(tracker: Particles, model: TrackerModel, seconds: number, random: Generator): void {
  const starts = 1 - Math.exp(-seconds / startSeconds);
  const rests = 1 - Math.exp(-seconds / restSeconds);
  const wander = rateWander * Math.sqrt(seconds);
  const { trips, rates, hysteresisErrors } = tracker;
  for (let i = 0; i < particles; i++) {
    const draw = random.uniform();
    if (rates[i] === 0) {
      if (draw < starts) {
        const sign = random.uniform() < contraryShare ? -model.askedSign : model.askedSign;
        // Slow turning is as likely as brisk, on the logarithm.
        rates[i] = sign * model.briskVoltsPerSecond * 1.5 * Math.exp(-4 * random.uniform());
      }
    } else if (draw < rests) rates[i] = 0;
    else rates[i] = rates[i]! * Math.max(0.2, 1 + wander * random.bell());
    trips[i] = trips[i]! + rates[i]! * seconds + 0.0003 * random.bell();
    hysteresisErrors[i] = hysteresisErrors[i]! * 0.99 + 0.0004 * random.bell();
  }
}

function weigh(tracker: Particles, model: TrackerModel, look: TrackerLook): Float64Array {
  const step = Math.abs(look.volts - look.fromVolts);
  // The commissioned overshoot is a bound; what happens is somewhat less, and known no better than that.
  const beyond = 0.7 * model.overshoot * step;
  const spread = Math.hypot(model.noiseVolts, 0.2 * model.overshoot * step, 0.0005);
  const flipped = look.before !== look.after;
  const weights = new Float64Array(particles);
  for (let i = 0; i < particles; i++) {
    const trip = tracker.trips[i]!;
    const distance =
      look.before === 'on'
        ? trip - (look.volts - (look.volts < look.fromVolts ? beyond : 0))
        : look.volts +
          (look.volts > look.fromVolts ? beyond : 0) -
          trip -
          model.hysteresisVolts -
          tracker.hysteresisErrors[i]!;
    const flips = surprise + (1 - 2 * surprise) * normalCdf(distance / spread);
    weights[i] = flipped ? flips : 1 - flips;
  }
  return weights;
}

/** Systematic redrawing in proportion to the weights. */
function redraw(from: Particles, weights: Float64Array, random: Generator): Particles {
  let total = 0;
  for (const weight of weights) total += weight;
  const step = total / particles;
  let position = random.uniform() * step;
  let sum = weights[0]!;
  let source = 0;
  const drawn: Particles = {
    trips: new Float64Array(particles),
    rates: new Float64Array(particles),
    hysteresisErrors: new Float64Array(particles),
  };
  for (let i = 0; i < particles; i++) {
    while (sum < position && source < particles - 1) sum += weights[++source]!;
    drawn.trips[i] = from.trips[source]!;
    drawn.rates[i] = from.rates[source]!;
    drawn.hysteresisErrors[i] = from.hysteresisErrors[source]!;
    position += step;
  }
  return drawn;
}

interface Generator {
  uniform(): number;
  normal(): number;
  /** Nearly normal, mean 0 and standard deviation 1, within ±2.45: the sum of two uniforms. */
  bell(): number;
  seed(): number;
}

/** Mulberry32, a small generator with its state in one integer; normal deviates by Box and Muller. */
function generator(seed: number): Generator {
  let state = seed >>> 0;
  const uniform = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  return {
    uniform,
    normal: () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform()),
    bell: () => Math.sqrt(6) * (uniform() + uniform() - 1),
    seed: () => state,
  };
}
