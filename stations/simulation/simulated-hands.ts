import type { BoardType } from '@/lib/contracts/board-type';
import type { CommandReply, DefectKind, HandsCommand, HandsView } from '@/lib/contracts/bench-command';
import type { Thresholds } from '@/lib/circuit/thresholds';
import type { TrimView } from '@/lib/trim/types';
import type { Clock } from '../clock/clock';
import { drawBoard, makeReferenceBoard } from './draw-board';
import { seededRandom, type Random } from './random';
import { SimulatedBoard } from './simulated-board';
import type { SimulatedBench } from './simulated-bench';
import { turnAsPrompted, turnScrew } from './turning';

/** How a board of the box is made: drawn from a seed, or a reference board of known points. */
export type BoardOrder = { boardType: BoardType } & (
  { kind: 'drawn'; seed: number; defect: DefectKind; targetVolts?: number } | { kind: 'reference'; points: Thresholds }
);

/** The box of boards beside a simulated bench. */
export interface BoardBox {
  /** The board a person would take next. */
  nextSerial(): Promise<string | null>;
  /** Null when there is no such board. */
  orderOf(serial: string): Promise<BoardOrder | null>;
}

export interface HandsOptions {
  bench: SimulatedBench;
  clock: Clock;
  seed: number;
  box: BoardBox;
  /** What the bench screen asks the operator to turn now; null when nothing. */
  prompt(): TrimView | null;
  onChange(view: HandsView): void;
}

const refuse = (code: string): CommandReply => ({ ok: false, code });

/** A person at a simulated bench: boards, lid, screw, cables. Boards keep their screw when taken off and put back. */
export class SimulatedHands {
  private serial: string | null = null;
  private order: BoardOrder | null = null;
  private next: string | null = null;
  private turning: Promise<unknown> = Promise.resolve();
  private readonly boards = new Map<string, SimulatedBoard>();
  private readonly random: Random;

  constructor(private readonly options: HandsOptions) {
    this.random = seededRandom(options.seed);
  }

  view(): HandsView {
    const { fixture, ports } = this.options.bench;
    fixture.advance();
    const board = fixture.seated;
    return {
      boardSerial: this.serial,
      lidClosed: fixture.lidClosed,
      screwTurns: board?.screwTurns ?? 0,
      travelTurns: board?.truth.trimmer.turns ?? 0,
      defect: board?.truth.defect ?? 'none',
      cables: {
        supply: ports.supply.isPlugged,
        meter: ports.meter.isPlugged,
        controller: ports.controller?.isPlugged ?? false,
      },
      nextSerial: this.next,
    };
  }

  /** Looks into the box again, as after a run or when a lot is chosen. */
  async lookIntoBox(): Promise<void> {
    this.next = await this.options.box.nextSerial();
    this.options.onChange(this.view());
  }

  /** Resolves when the hands are done, which takes time on the bench's clock. */
  async perform(command: HandsCommand): Promise<CommandReply> {
    const reply = await this.act(command);
    this.options.onChange(this.view());
    return reply;
  }

  private async act(command: HandsCommand): Promise<CommandReply> {
    const { bench, clock, prompt } = this.options;
    const { fixture, ports } = bench;
    switch (command.kind) {
      case 'place-board':
        return this.place(command.serial);
      case 'remove-board':
        if (fixture.lidClosed) return refuse('hands.lid-closed');
        if (!fixture.seated) return refuse('hands.no-board');
        fixture.seat(null);
        this.serial = null;
        this.order = null;
        await this.lookIntoBox();
        return { ok: true };
      case 'lid':
        fixture.setLid(command.closed);
        return { ok: true };
      case 'turn':
        if (!fixture.seated) return refuse('hands.no-board');
        return this.oneTurnAtATime(() => turnScrew({ fixture, clock }, command.turns));
      case 'turn-as-prompted':
        if (!fixture.seated) return refuse('hands.no-board');
        if (!prompt()?.direction) return refuse('hands.no-prompt');
        return this.oneTurnAtATime(() =>
          turnAsPrompted({
            fixture,
            clock,
            random: this.random,
            prompt,
            onMove: () => this.options.onChange(this.view()),
          }),
        );
      case 'bump-supply':
        fixture.interrupt(command.milliseconds);
        return { ok: true };
      case 'cable': {
        const port = ports[command.which];
        if (!port) return refuse('hands.no-controller');
        port.setPlugged(command.plugged);
        return { ok: true };
      }
      case 'defect':
        return this.refit(command.defect);
    }
  }

  private async place(wanted: string | undefined): Promise<CommandReply> {
    const { fixture } = this.options.bench;
    if (fixture.lidClosed) return refuse('hands.lid-closed');
    if (fixture.seated) return refuse('hands.fixture-full');
    const { box } = this.options;
    const serial = wanted ?? (await box.nextSerial());
    if (serial === null) return refuse('hands.box-empty');
    const order = await box.orderOf(serial);
    if (!order) return refuse('hands.unknown-board');
    if (fixture.seated) return refuse('hands.fixture-full');
    const board = this.boards.get(serial) ?? new SimulatedBoard(truthOf(order));
    this.boards.set(serial, board);
    this.serial = serial;
    this.order = order;
    fixture.seat(board);
    return { ok: true };
  }

  /** Another defect, or none, on the same board; its screw stays. */
  private refit(defect: DefectKind): CommandReply {
    const { fixture } = this.options.bench;
    const { serial, order } = this;
    const board = fixture.seated;
    if (!board || serial === null || order?.kind !== 'drawn') return refuse('hands.no-board');
    const refitted = new SimulatedBoard(truthOf({ ...order, defect }));
    refitted.turnTo(board.screwTurns);
    this.boards.set(serial, refitted);
    fixture.seat(refitted);
    return { ok: true };
  }

  private async oneTurnAtATime(turn: () => Promise<void>): Promise<CommandReply> {
    const mine = this.turning.then(turn);
    this.turning = mine.catch(() => undefined);
    await mine;
    return { ok: true };
  }
}

function truthOf(order: BoardOrder) {
  if (order.kind === 'reference') return makeReferenceBoard(order.boardType, order.points);
  const { boardType, seed, defect, targetVolts } = order;
  return drawBoard(boardType, seed, defect, targetVolts === undefined ? {} : { targetVolts });
}
