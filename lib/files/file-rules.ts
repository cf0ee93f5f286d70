import type { FileKind } from '../contracts/stored-states';
import type { RecognisedType } from './recognise-type';

/** What may be stored as each kind. A picture is re-encoded; a PDF is kept as it came. */
export interface FileRule {
  types: readonly RecognisedType[];
  /** As refusals and hints say it: "JPEG, PNG or WebP, at most 8 MB". */
  words: string;
  /** For the browser's file dialog. */
  accept: string;
}

/** 8 MB, of 1,000,000 bytes each. */
export const mostFileBytes = 8_000_000;
/** Pixels of the longer side after re-encoding. */
export const mostSidePixels = 2_400;
/** More pixels than this are not decoded: a small file can unpack to gigabytes. */
export const mostPixels = 50_000_000;

const pictures = {
  types: ['JPEG', 'PNG', 'WebP'],
  words: 'JPEG, PNG or WebP, at most 8 MB',
  accept: 'image/jpeg,image/png,image/webp',
} as const;

export const fileRules: Record<FileKind, FileRule> = {
  'trimmer-photo': pictures,
  'instruction-picture': pictures,
  'fixture-drawing': {
    types: [...pictures.types, 'PDF'],
    words: 'PDF, JPEG, PNG or WebP, at most 8 MB',
    accept: `${pictures.accept},application/pdf`,
  },
};
