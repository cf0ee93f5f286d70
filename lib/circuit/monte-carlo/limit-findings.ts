import { tolerancesOf, type BoardType } from '../../contracts/board-type';
import type { BoardDesign } from '../board-design';
import { wiperForTrip } from '../inverse';
import {
  contributions,
  largestPart,
  pointParts,
  pointSensitivities,
  trimmedSensitivity,
  type PointPart,
  type Sensitivity,
} from '../sensitivities';
import { limitNames } from './apply-fix';
import { findFix, negligibleShare, type Question } from './find-fix';
import { nodeAt, nodesNear } from './node-voltage';
import { judgedQuantities, type JudgedQuantity, type LimitFinding, type Misses } from './types';

/** Limits that boards miss although each is trimmed as well as it can be, with the part that drives it and one way out. */
export function limitFindings(question: Question): LimitFinding[] {
  const { boardType, asIs } = question;
  return judgedQuantities
    .filter((quantity) => asIs.misses[quantity].below + asIs.misses[quantity].above >= negligibleShare)
    .map((quantity) => {
      const misses = asIs.misses[quantity];
      const driver = driverOf(boardType, quantity, misses, asIs.targetVolts);
      const limits = quantity === 'target' ? null : boardType.limits[limitNames[quantity]];
      return { quantity, misses, limits, driver, fix: findFix(question, quantity, driver.part) };
    });
}

function driverOf(boardType: BoardType, quantity: JudgedQuantity, misses: Misses, targetVolts: number) {
  const variances = contributions(
    sensitivityOf(boardType.design, quantity, misses, targetVolts),
    tolerancesOf(boardType),
  );
  const part: PointPart = largestPart(variances);
  const all = pointParts.reduce((sum, each) => sum + variances[each], 0);
  return { part, share: all > 0 ? variances[part] / all : 0 };
}

function sensitivityOf(
  design: BoardDesign,
  quantity: JudgedQuantity,
  misses: Misses,
  targetVolts: number,
): Sensitivity {
  const node = nodeAt(design.reference, targetVolts);
  const wanted = wiperForTrip(design, targetVolts, node);
  // The end of the travel that falls short; else where the typical board is trimmed.
  const end = misses.below >= misses.above ? 0 : 1;
  const wiper = quantity === 'target' ? end : Math.min(1, Math.max(0, wanted));
  const nodes = nodesNear(design, wiper, node, node);
  const all = pointSensitivities(design, wiper, {
    tripReferenceVolts: nodes.trip,
    releaseReferenceVolts: nodes.release,
  });
  switch (quantity) {
    case 'target':
      return all.trip;
    case 'reference':
      return all.reference;
    case 'release':
    case 'hysteresis':
      return trimmedSensitivity(all);
  }
}
