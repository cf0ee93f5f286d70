import type { DefectKind } from '@/lib/contracts/bench-command';
import type { BoardType } from '@/lib/contracts/board-type';
import type { BoardDesign } from '@/lib/circuit/board-design';
import { referenceAt, softKneeThresholds } from '@/lib/circuit/soft-knee';
import { wiperAt } from '@/lib/circuit/trimmer';
import type { RunEffect, RunEvent } from '@/lib/run/types';

/** mulberry32: small seeded generator, good enough to shake a plant. */
export function seeded(seed: number): () => number {
  let a = seed >>> 0;
  return () => {
    a = (a + 0x6d2b79f5) | 0;
    let t = Math.imul(a ^ (a >>> 15), 1 | a);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
function normal(random: () => number): number {
  return Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
}

export interface PlantOptions {
  boardType: BoardType;
  seed: number;
  defect?: DefectKind;
  /** Screw position at the start; near the middle of the demo types when absent. */
  startTripVolts?: number;
  hasController?: boolean;
  /** Width of an interruption as achieved, against the one asked for. */
  pulseShare?: number;
  /** Parts that differ from the nominal ones. */
  parts?: Partial<BoardDesign>;
  /** How fast the reference node walks away. */
  driftVoltsPerSecond?: number;
}

type Answer = Extract<RunEvent, { id: number }>;

/**
 * A bench without bytes: a latch on the closed-form circuit behind a supply that overshoots by 5 % of every step, on a clock
 * of its own. Everything random comes from the seed.
 */
export class Plant {
  nowMs = 1_000;
  screwTurns: number;
  lidClosed = false;
  boardPresent = false;
  /** Highest voltage that ever stood at the board's terminals. */
  peakVolts = 0;
  supplyOn = false;
  private setVolts = 0;
  private output: 'on' | 'off' = 'off';
  private currentLimitAmps = 1;
  private readonly random: () => number;
  private readonly design: BoardDesign;
  private readonly defect: DefectKind;
  private readonly offsetVolts: number;
  private readonly boardType: BoardType;
  private readonly pulseShare: number;
  private readonly driftVoltsPerSecond: number;

  constructor(options: PlantOptions) {
    this.boardType = options.boardType;
    this.pulseShare = options.pulseShare ?? 1;
    this.driftVoltsPerSecond = options.driftVoltsPerSecond ?? 0;
    this.random = seeded(options.seed);
    this.defect = options.defect ?? 'none';
    this.offsetVolts = 0.002 * normal(this.random);
    this.design = { ...spread(options.boardType.design, this.random, this.defect), ...options.parts };
    this.screwTurns =
      this.defect === 'trimmer-at-end'
        ? this.lowestTripTurns()
        : this.turnsFor(options.startTripVolts ?? this.boardType.limits.tripVolts.min - 0.25);
  }

  private lowestTripTurns(): number {
    return this.boardType.trimmer.clockwise === 'raises' ? 0 : this.boardType.trimmer.turns;
  }

  private turnsFor(tripVolts: number): number {
    let [low, high] = [0, this.boardType.trimmer.turns];
    const rises = this.boardType.trimmer.clockwise === 'raises';
    for (let i = 0; i < 50; i++) {
      const middle = (low + high) / 2;
      const points = softKneeThresholds(this.design, wiperAt(this.boardType.trimmer, middle));
      if (points.kind !== 'found') throw new Error('The demo board has no points.');
      if (points.tripVolts < tripVolts === rises) low = middle;
      else high = middle;
    }
    return (low + high) / 2;
  }

  /** True points now; a stuck board has none. */
  points(): { tripVolts: number; releaseVolts: number } {
    switch (this.defect) {
      case 'output-shorted':
        return { tripVolts: -1, releaseVolts: -1 };
      case 'zener-open':
      case 'op-amp-missing':
        return { tripVolts: 99, releaseVolts: 99 };
      case 'zener-reversed':
        return { tripVolts: 1.5, releaseVolts: 1.6 };
    }
    const points = softKneeThresholds(this.design, wiperAt(this.boardType.trimmer, this.screwTurns));
    if (points.kind !== 'found') throw new Error('The demo board has no points.');
    const jump = this.defect === 'noisy-wiper' ? 0.06 * normal(this.random) : 0;
    return { tripVolts: points.tripVolts + jump, releaseVolts: points.releaseVolts + jump };
  }

  turn(turns: number): void {
    if (this.defect === 'trimmer-at-end' || this.defect === 'wiper-open') return;
    this.screwTurns = Math.min(this.boardType.trimmer.turns, Math.max(0, this.screwTurns + turns));
    this.switchAt(this.setVolts);
  }

  private switchAt(volts: number): void {
    const { tripVolts, releaseVolts } = this.points();
    const noise = 0.001 * normal(this.random);
    if (this.output === 'on' ? volts <= tripVolts + noise : volts >= releaseVolts + noise) {
      this.output = this.output === 'on' ? 'off' : 'on';
    }
    // A board without hysteresis answers at once again; which way is chance.
    if (releaseVolts - tripVolts < 0.002 && Math.abs(volts - tripVolts) < 0.003) {
      this.output = this.random() < 0.5 ? 'on' : 'off';
    }
  }

  private step(volts: number): void {
    const target = volts + this.offsetVolts;
    const before = this.setVolts;
    const peak = target + 0.05 * (target - before);
    this.peakVolts = Math.max(this.peakVolts, peak, target);
    this.switchAt(peak);
    this.switchAt(target);
    this.setVolts = target;
  }

  private amps(): number {
    if (this.defect === 'supply-short') return this.currentLimitAmps;
    const loadAmps = this.output === 'on' ? this.setVolts / this.design.loadOhms : 0;
    const share = this.defect === 'op-amp-missing' ? 0.5 : 1;
    const own = this.design.quiescentAmps * share * Math.min(1, this.setVolts / this.boardType.limits.tripVolts.min);
    return own + loadAmps;
  }

  private read(volts: number): number {
    return volts + 0.0002 * normal(this.random);
  }

  private readVolts(channel: 101 | 102 | 103 | 104): number {
    const supply = this.terminalVolts();
    switch (channel) {
      case 101:
        return this.read(supply);
      case 102:
        return this.read(this.output === 'on' ? supply - this.design.outputDropVolts : this.design.outputLowVolts);
      case 103: {
        if (this.defect === 'zener-open') return this.read(supply);
        if (this.defect === 'zener-reversed') return this.read(0.7);
        const node = referenceAt(this.design.reference, supply);
        const walked = (this.driftVoltsPerSecond * this.nowMs) / 1000;
        return this.read((node.kind === 'found' ? node.x : 0) + walked);
      }
      case 104:
        return this.read(this.wiperVolts(supply));
    }
  }

  /** By superposition at the wiper, with the output's part through the feedback resistor. */
  private wiperVolts(supply: number): number {
    const wiper = wiperAt(this.boardType.trimmer, this.screwTurns);
    const { supplyEndOhms, groundEndOhms, trimmerOhms, feedbackOhms, outputDropVolts, outputLowVolts } = this.design;
    const toSupply = 1 / (supplyEndOhms + (1 - wiper) * trimmerOhms);
    const toGround = 1 / (groundEndOhms + wiper * trimmerOhms);
    const feedback = 1 / feedbackOhms;
    const output = this.output === 'on' ? supply - outputDropVolts : outputLowVolts;
    return (supply * toSupply + output * feedback) / (toSupply + toGround + feedback);
  }

  private terminalVolts(): number {
    if (!this.supplyOn || this.defect === 'lifted-contact') return 0.01;
    return this.defect === 'supply-short' ? 0.2 : this.setVolts;
  }

  /** Does what the effect says; the answer carries the plant's own time. */
  perform(effect: Exclude<RunEffect, { kind: 'record-run' }>): Answer {
    const { id } = effect;
    const at = (ms: number) => ({ atMs: (this.nowMs += ms), id });
    switch (effect.kind) {
      case 'read-fixture':
        return { ...at(20), kind: 'fixture-read', lidClosed: this.lidClosed, boardPresent: this.boardPresent };
      case 'prepare-supply':
        this.currentLimitAmps = effect.currentLimitAmps;
        this.off();
        return { ...at(60), kind: 'prepared' };
      case 'supply-on':
        if (!this.lidClosed || !this.boardPresent) throw new Error('Energised an open fixture.');
        this.supplyOn = true;
        this.output = 'off';
        this.step(effect.volts);
        return {
          ...at(effect.settleMs + 30),
          kind: 'supply-is-on',
          volts: this.read(this.terminalVolts()),
          amps: this.amps(),
        };
      case 'probe': {
        const voltsBefore = effect.readBefore ? this.read(this.terminalVolts()) : null;
        this.step(effect.volts);
        const volts = this.read(this.terminalVolts());
        return { ...at(effect.dwellMs + 20), kind: 'probed', voltsBefore, volts, output: this.output };
      }
      case 'sense':
        this.switchAt(this.setVolts);
        return { ...at(20), kind: 'sensed', output: this.output };
      case 'measure':
        return { ...at(40), kind: 'measured', volts: this.readVolts(effect.channel) };
      case 'measure-supply': {
        const open = this.defect === 'lifted-contact';
        const volts = this.defect === 'supply-short' ? 0.2 : this.setVolts;
        return { ...at(30), kind: 'supply-measured', volts, amps: open ? 0 : this.amps() };
      }
      case 'measure-wiper': {
        const wiperVolts = this.readVolts(104);
        return { ...at(40), kind: 'wiper-measured', wiperVolts, supplyVolts: this.readVolts(101) };
      }
      case 'pulse': {
        const farads = this.defect === 'reservoir-missing' ? 1e-7 : this.design.reservoirFarads;
        const droop = Math.exp(-effect.seconds / (farads * this.design.loadOhms));
        const before = this.setVolts;
        this.switchAt(before * droop);
        this.switchAt(before);
        return { ...at(50), kind: 'pulsed', seconds: effect.seconds * this.pulseShare };
      }
      case 'wait':
        return { ...at(effect.milliseconds), kind: 'waited' };
      case 'supply-off':
        this.off();
        return { ...at(200), kind: 'supply-is-off', confirmed: true, volts: 0.1, by: 'meter' };
    }
  }

  private off(): void {
    this.supplyOn = false;
    this.setVolts = 0;
    this.output = 'off';
  }
}

/** A board of the line: parts within their tolerances, and the defect's part. */
function spread(design: BoardDesign, random: () => number, defect: DefectKind): BoardDesign {
  const about = (value: number, share: number) => value * (1 + share * Math.max(-2, Math.min(2, normal(random))));
  return {
    ...design,
    reference: {
      ...design.reference,
      nominalVolts:
        defect === 'wrong-zener' ? design.reference.nominalVolts * 1.1 : about(design.reference.nominalVolts, 0.004),
    },
    trimmerOhms: about(design.trimmerOhms, 0.03),
    supplyEndOhms: about(design.supplyEndOhms, 0.003),
    groundEndOhms: about(design.groundEndOhms, 0.003),
    feedbackOhms:
      {
        'wrong-feedback': design.feedbackOhms / 2.2,
        'feedback-open': 1e9,
      }[defect as string] ?? about(design.feedbackOhms, 0.003),
  };
}
