import { tolerancesOf, type BoardType } from '../../contracts/board-type';
import type { PointPart } from '../sensitivities';
import type { LimitFix } from './types';

/** The board type with the fix in it. A `target` fix changes the sequence, not the board type. */
export function applyFix(boardType: BoardType, fix: LimitFix): BoardType {
  switch (fix.kind) {
    case 'target':
      return boardType;
    case 'limits': {
      const name = limitNames[fix.quantity];
      return {
        ...boardType,
        limits: { ...boardType.limits, [name]: { min: fix.minVolts, max: fix.maxVolts } },
      };
    }
    case 'parts': {
      let { design } = boardType;
      const tolerances = { ...tolerancesOf(boardType) };
      for (const { part, value, tolerance } of fix.changes) {
        if (value !== undefined) design = withValue(design, part, value);
        if (tolerance !== undefined) tolerances[part] = tolerance;
      }
      return { ...boardType, design, tolerances };
    }
  }
}

export const limitNames = {
  release: 'releaseVolts',
  hysteresis: 'hysteresisVolts',
  reference: 'referenceVolts',
} as const;

function withValue(design: BoardType['design'], part: PointPart, value: number): BoardType['design'] {
  switch (part) {
    case 'referenceVolts':
      return { ...design, reference: { ...design.reference, nominalVolts: value } };
    case 'referenceKnee':
      return { ...design, reference: { ...design.reference, kneeVolts: value } };
    case 'feedOhms':
      return { ...design, reference: { ...design.reference, feedOhms: value } };
    case 'comparatorOffsetVolts':
      return design;
    default:
      return { ...design, [part]: value };
  }
}

/** Nominal value in the part's own unit; 0 of the comparator's offset. */
export function valueOf({ reference, ...design }: BoardType['design'], part: PointPart): number {
  switch (part) {
    case 'referenceVolts':
      return reference.nominalVolts;
    case 'referenceKnee':
      return reference.kneeVolts;
    case 'feedOhms':
      return reference.feedOhms;
    case 'comparatorOffsetVolts':
      return 0;
    default:
      return design[part];
  }
}
