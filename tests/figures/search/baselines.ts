import type { OutputState, SearchSettings } from '../../../lib/search/types';
import type { Plant } from '../plant';
import type { Found, Start } from './methods';

interface Bracket {
  /** Readings on either side of the threshold. */
  before: number;
  beyond: number;
}

/** The usual ways to find both points, as they are done: no waypoints, no regard to what an overshoot does. */
export class Ramp {
  private settles = 0;
  private volts: number;
  private output: OutputState;

  constructor(
    private readonly plant: Plant,
    private readonly settings: SearchSettings,
    start: Start,
  ) {
    this.volts = start.volts;
    this.output = start.output;
  }

  /** From the top of each range in steps until the output answers; the middle of the last step. */
  async ramp(step: number): Promise<Found> {
    const { tripMaxVolts, supplyMaxVolts } = this.settings;
    await this.go(supplyMaxVolts);
    await this.go(tripMaxVolts);
    const trip = await this.stepUntil('off', tripMaxVolts, -step);
    const release = await this.stepUntil('on', this.volts, step);
    return this.found(trip, release);
  }

  /** Coarse steps until the output answers, armed anew, then fine steps through the last coarse one. */
  async coarsePlusFine(coarse: number, fine: number): Promise<Found> {
    const { tripMaxVolts, supplyMaxVolts, supplyMinVolts } = this.settings;
    await this.go(supplyMaxVolts);
    await this.go(tripMaxVolts);
    const coarseTrip = await this.stepUntil('off', tripMaxVolts, -coarse);
    await this.go(supplyMaxVolts);
    await this.go(coarseTrip.before);
    const trip = await this.stepUntil('off', coarseTrip.before, -fine);
    const coarseRelease = await this.stepUntil('on', this.volts, coarse);
    await this.go(supplyMinVolts);
    await this.go(coarseRelease.before);
    const release = await this.stepUntil('on', coarseRelease.before, fine);
    return this.found(trip, release);
  }

  /** Halves each range, arming the board from the far end of the supply before every look. */
  async bisection(resolution: number): Promise<Found> {
    const { tripMinVolts, tripMaxVolts, supplyMaxVolts, supplyMinVolts, hysteresisMinVolts } = this.settings;
    const trip = { before: tripMaxVolts, beyond: tripMinVolts };
    while (trip.before - trip.beyond > resolution) {
      const middle = (trip.before + trip.beyond) / 2;
      await this.go(supplyMaxVolts);
      await this.go(middle);
      if (this.output === 'off') trip.beyond = middle;
      else trip.before = middle;
    }
    const release = { before: tripMinVolts + hysteresisMinVolts, beyond: supplyMaxVolts };
    while (release.beyond - release.before > resolution) {
      const middle = (release.before + release.beyond) / 2;
      await this.go(supplyMinVolts);
      await this.go(middle);
      if (this.output === 'on') release.beyond = middle;
      else release.before = middle;
    }
    return this.found(trip, release);
  }

  private async go(volts: number): Promise<void> {
    const seen = await this.plant.apply(volts, 'settle');
    this.settles++;
    this.volts = seen.volts;
    this.output = seen.output;
  }

  private async stepUntil(output: OutputState, fromVolts: number, step: number): Promise<Bracket> {
    const { supplyMinVolts, supplyMaxVolts } = this.settings;
    let before = this.volts;
    for (let at = fromVolts; this.output !== output;) {
      before = this.volts;
      at += step;
      if (at < supplyMinVolts || at > supplyMaxVolts + 1e-9) break;
      await this.go(at);
    }
    return { before, beyond: this.volts };
  }

  private found(trip: Bracket, release: Bracket): Found {
    return {
      kind: 'found',
      trip: (trip.before + trip.beyond) / 2,
      release: (release.before + release.beyond) / 2,
      settles: this.settles,
      endCheckSettles: 0,
    };
  }
}
