import type { RejectReason } from '../run/types';
import en from './en.json';

/** Why a board was rejected, in English: the same words as at the bench, without its question. */
export const rejectWords: Record<RejectReason, string> = {
  ...en.reject,
  'operator-check-failed': 'Operator check failed',
};
