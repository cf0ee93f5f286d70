import type { Clock } from '../clock/clock';
import { feedAmps, limitedVolts, voltsAtBoard, voltsOnReservoir, type Feed } from './board-feed';
import type { Random } from './random';
import { handAt, type ScrewTurning } from './screw-turning';
import type { SimulatedBoard } from './simulated-board';
import { ThresholdNoise } from './threshold-noise';
import { StepResponse, usualStep, type StepCharacter } from './step-response';

export interface FixtureCharacter {
  step: StepCharacter;
  /** Nails in parallel between the sense point and the board, ohms. */
  contactOhms: number;
}

export const usualFixture: FixtureCharacter = { step: usualStep, contactOhms: 0.002 };

/** How fast the supply's output stage pulls the terminals down once off. */
const dischargeMs = 15;
/**
 * The physics of one bench: the supply's output with its ring, nails, the board with its latch, the lid's inhibit and
 * the series switch. Nothing happens between calls; each call first brings everything up to the clock. The latch sees
 * the extremes of every ring, so it trips on an undershoot that no integrating meter can see.
 */
export class SimulatedFixture {
  private readonly step: StepResponse;
  private board: SimulatedBoard | null = null;
  private output: 'on' | 'off' = 'off';
  private offSince = { ms: 0, volts: 0 };
  private targetVolts = 0;
  private limitAmps = 1;
  private overvoltageAt = Infinity;
  private tripped = false;
  private lid = false;
  private latched = false;
  private chattering = false;
  private interruption: { fromMs: number; untilMs: number; startVolts: number } | null = null;
  private turning: ScrewTurning | null = null;
  private readonly noise: ThresholdNoise;
  private atMs = 0;

  constructor(
    private readonly clock: Pick<Clock, 'now'>,
    private readonly random: Random,
    readonly character: FixtureCharacter = usualFixture,
  ) {
    this.step = new StepResponse(character.step);
    this.noise = new ThresholdNoise(random);
    this.atMs = clock.now();
  }

  get seated(): SimulatedBoard | null {
    return this.board;
  }

  get lidClosed(): boolean {
    return this.lid;
  }

  seat(board: SimulatedBoard | null): void {
    this.advance();
    this.turning = null;
    this.board = board;
    this.latched = false;
    this.drawNoise();
    this.judge(this.supplyVolts(this.atMs));
  }

  /** Opening the lid acts on the supply's inhibit input. */
  setLid(closed: boolean): void {
    this.advance();
    this.lid = closed;
    if (!closed) this.goOff();
  }

  // The supply's side.

  setTarget(volts: number): void {
    this.advance();
    this.targetVolts = volts;
    if (this.output === 'on') this.step.aim(volts, this.atMs);
    this.drawNoise();
  }

  setCurrentLimit(amps: number): void {
    this.advance();
    this.limitAmps = amps;
  }

  setOvervoltage(volts: number): void {
    this.advance();
    this.overvoltageAt = volts;
  }

  /** False when the inhibit input or a tripped protection forbids it. */
  switchOn(): boolean {
    this.advance();
    if (!this.lid || this.tripped) return false;
    if (this.output === 'off') {
      this.step.restAt(this.supplyVolts(this.atMs), this.atMs);
      this.output = 'on';
      this.step.aim(this.targetVolts, this.atMs);
      this.drawNoise();
    }
    return true;
  }

  switchOff(): void {
    this.advance();
    this.goOff();
  }
  get isOn(): boolean {
    this.advance();
    return this.output === 'on';
  }
  get overvoltageTripped(): boolean {
    this.advance();
    return this.tripped;
  }
  clearOvervoltage(): void {
    this.tripped = false;
  }

  // What can be measured now.

  senseVolts(): number {
    this.advance();
    return this.limited(this.supplyVolts(this.atMs));
  }

  amps(): number {
    this.advance();
    if (!this.board || this.interruption) return 0;
    return this.ampsAt(this.limited(this.supplyVolts(this.atMs)), this.isLoadOn());
  }

  /** Means over the window that ends now, of a node of the board. */
  channelVolts(channel: number, windowMs: number): number {
    this.advance();
    const { board } = this;
    if (!board) return 0;
    const on = this.isLoadOn();
    const mean =
      this.output === 'on' ? this.step.meanBetween(this.atMs - windowMs, this.atMs) : this.supplyVolts(this.atMs);
    const volts = this.interruption ? this.boardVolts() : this.atBoard(this.limited(Math.max(0, mean)), on);
    if (channel === 101) return volts;
    if (channel === 102) return board.outputVolts(volts, on);
    if (channel === 103) return board.referenceVolts(volts);
    return channel === 104 ? board.wiperVolts(volts, on) : 0;
  }

  /** True where the output is on; a real one, not what a station believes. */
  outputOn(): boolean {
    this.advance();
    return this.isLoadOn();
  }

  // Hands and the series switch.

  /** Breaks the supply for so long, as the series switch or a bumped connector does. */
  interrupt(milliseconds: number): void {
    this.advance();
    this.interruption = { fromMs: this.atMs, untilMs: this.atMs + milliseconds, startVolts: this.boardVolts() };
  }

  /** Turns the screw from now on, at `turnsPerSecond`; positive is clockwise. */
  startTurning(turns: number, turnsPerSecond: number): void {
    this.advance();
    if (!this.board) return;
    const fromTurns = this.board.screwTurns;
    this.turning = { fromTurns, byTurns: turns, startedMs: this.atMs, turnsPerSecond };
  }

  stopTurning(): void {
    this.advance();
    this.turning = null;
  }

  /** Brings everything up to the clock. */
  advance(): void {
    const now = this.clock.now();
    if (now <= this.atMs) return;
    const pulse = this.interruption;
    if (pulse && pulse.untilMs <= now) {
      this.atMs = pulse.untilMs;
      this.interruption = null;
      this.judgeTerminals(this.decayed(pulse, pulse.untilMs - pulse.fromMs));
    } else if (pulse) {
      this.atMs = now;
      return;
    }
    this.turnScrew(now);
    this.followSupply(now);
    this.atMs = now;
  }

  private followSupply(now: number): void {
    if (this.output === 'on') {
      for (const ms of this.step.turningPoints(this.atMs, now)) if (!this.follow(ms)) return;
      this.follow(now);
    } else this.judge(this.supplyVolts(now));
  }

  /** False once the overvoltage protection has tripped. */
  private follow(ms: number): boolean {
    const volts = this.step.at(ms);
    if (volts > this.overvoltageAt) {
      this.atMs = ms;
      this.tripped = true;
      this.goOff();
      return false;
    }
    this.judge(volts);
    return true;
  }

  private turnScrew(now: number): void {
    const { turning, board } = this;
    if (!board) return;
    if (turning) {
      const { turns, done } = handAt(turning, now);
      board.turnTo(turns);
      if (done) this.turning = null;
    }
    const restless = turning !== null || board.truth.wiperJumpVolts > 0;
    if (restless && this.noise.isStale(now)) this.drawNoise(now);
  }

  private drawNoise(ms = this.atMs): void {
    if (this.board) this.noise.draw(this.board.truth, ms);
  }

  /** Lets the latch see a supply voltage, at the sense point. */
  private judge(senseVolts: number): void {
    const { board } = this;
    if (!board) return;
    const volts = this.limited(senseVolts);
    this.judgeTerminals(this.atBoard(volts, this.latched));
    if (this.character.contactOhms + board.truth.padOhms === 0) return;
    // After a flip the load current changes the drop at the nails, which may flip it back: that is chatter.
    const before = this.latched;
    this.judgeTerminals(this.atBoard(volts, before));
    this.chattering = this.latched !== before;
  }

  private judgeTerminals(volts: number): void {
    const { board } = this;
    if (!board) return;
    const { tripVolts, releaseVolts } = board.thresholds();
    if (this.latched && volts < tripVolts + this.noise.trip) this.latched = false;
    else if (!this.latched && volts > releaseVolts + this.noise.release) this.latched = true;
  }

  private isLoadOn(): boolean {
    return this.chattering ? this.random.uniform() < 0.5 : this.latched;
  }

  private goOff(): void {
    if (this.output === 'off') return;
    this.offSince = { ms: this.atMs, volts: this.step.at(this.atMs) };
    this.output = 'off';
  }

  /** At the sense point with no regard to the current limit. */
  private supplyVolts(ms: number): number {
    if (this.output === 'on') return this.step.at(ms);
    return this.offSince.volts * Math.exp(-(ms - this.offSince.ms) / dischargeMs);
  }

  private boardVolts(): number {
    const pulse = this.interruption;
    if (pulse) return this.decayed(pulse, this.atMs - pulse.fromMs);
    return this.atBoard(this.limited(this.supplyVolts(this.atMs)), this.latched);
  }

  /** The reservoir feeding the board alone for so long. */
  private decayed(pulse: { startVolts: number }, milliseconds: number): number {
    const feed = this.feed(this.latched);
    return feed ? voltsOnReservoir(feed, pulse.startVolts, milliseconds) : 0;
  }

  private ampsAt(senseVolts: number, on: boolean): number {
    const feed = this.feed(on);
    return feed ? feedAmps(feed, senseVolts) : 0;
  }

  private atBoard(senseVolts: number, on: boolean): number {
    const feed = this.feed(on);
    return feed ? voltsAtBoard(feed, senseVolts) : 0;
  }

  private limited(volts: number): number {
    const feed = this.feed(this.latched);
    return feed ? limitedVolts(feed, this.limitAmps, volts) : volts;
  }

  private feed(on: boolean): Feed | null {
    return this.board && { board: this.board, contactOhms: this.character.contactOhms, on };
  }
}
