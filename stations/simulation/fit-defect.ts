import type { DefectKind } from '@/lib/contracts/bench-command';
import type { BoardTruth } from './board-truth';
import type { Random } from './random';

/** Zeners come in E24 values; a wrong reel is another one. */
const wrongZenerRatios = [0.82, 0.91, 1.1, 1.22];
/** A decade, or E-series steps in the wrong box. */
const wrongFeedbackRatios = [10, 2.2, 0.45];

/** Makes a sound board defective. `targetTurns` is where the screw would have to go. */
export function fitDefect(
  sound: BoardTruth,
  defect: DefectKind,
  { targetTurns, random }: { targetTurns: number; random: Random },
): BoardTruth {
  const { design } = sound;
  const truth = { ...sound, defect };
  switch (defect) {
    case 'none':
      return truth;
    case 'supply-short':
      return { ...truth, shortOhms: random.between(1, 4) };
    case 'zener-open':
      return { ...truth, zener: 'open' };
    case 'zener-reversed':
      return { ...truth, zener: 'reversed' };
    case 'wrong-zener': {
      const nominalVolts = design.reference.nominalVolts * random.pick(wrongZenerRatios);
      return { ...truth, design: { ...design, reference: { ...design.reference, nominalVolts } } };
    }
    case 'feedback-open':
      return { ...truth, design: { ...design, feedbackOhms: 1e10 } };
    case 'wrong-feedback':
      return { ...truth, design: { ...design, feedbackOhms: design.feedbackOhms * random.pick(wrongFeedbackRatios) } };
    case 'op-amp-missing':
      return { ...truth, output: 'dead' };
    case 'output-shorted':
      return { ...truth, output: 'shorted' };
    case 'wiper-open':
      return { ...truth, wiperFollows: false };
    case 'trimmer-at-end':
      // The stop stands where the screw is, on the side of the target.
      return {
        ...truth,
        stops:
          targetTurns > truth.screwTurns
            ? { ...truth.stops, maxTurns: truth.screwTurns }
            : { ...truth.stops, minTurns: truth.screwTurns },
      };
    case 'noisy-wiper':
      return { ...truth, wiperJumpVolts: random.between(0.02, 0.04) };
    case 'reservoir-missing':
      return { ...truth, design: { ...design, reservoirFarads: 0 } };
    case 'lifted-contact':
      return { ...truth, padOhms: random.between(80, 200) };
  }
}
