'use client';

import { useEffect, useMemo, useRef, useState } from 'react';
import {
  formOf,
  numberFields,
  readForm,
  writeField,
  type BoardTypeForm,
  type FieldSentences,
} from '@/lib/board-type/board-type-form';
import { checkBoardType, type BoardTypeFinding } from '@/lib/board-type/check-board-type';
import { readQuantity } from '@/lib/board-type/quantity-text';
import { degreesATurn, thresholdAmpsField, thresholdVoltsField } from '@/lib/board-type/fields';
import { degreesStyle } from '@/lib/board-type/quantity-styles';
import type { BoardType } from '@/lib/contracts/board-type';
import type { BoardTypeRevisionHead } from '@/lib/contracts/board-type-revision';
import type { FormAccess } from './form-context';

export interface DraftForm {
  access: FormAccess;
  /** Null while a value cannot be read. */
  boardType: BoardType | null;
  unreadable: FieldSentences;
  findings: BoardTypeFinding[];
  /** Differs from what is saved. */
  dirty: boolean;
  /** What was typed earlier in this tab and not saved is shown again. */
  restored: boolean;
  /** Takes the values of another board type, such as one with a fix in it. */
  take(boardType: BoardType): void;
  replace(form: BoardTypeForm): void;
  /** The saved version that what is typed was made from. */
  version: number;
  /** What is typed now counts as saved under this version. */
  saved(version: number): void;
  revert(): void;
}

/** What is typed into a board type, kept in this tab until it is saved: nothing typed is lost. */
export function useDraftForm(
  { id, specification, version: opened }: Pick<BoardTypeRevisionHead, 'id' | 'specification' | 'version'>,
  readOnly: boolean,
): DraftForm {
  const keptAs = `board-type:${id}`;
  const stored = useMemo(() => formOf(specification), [specification]);
  const [base, setBase] = useState(stored);
  const [form, setForm] = useState(stored);
  const [version, setVersion] = useState(opened);
  const [restored, setRestored] = useState(false);
  const { boardType, unreadable } = useMemo(() => readForm(form, specification.code), [form, specification.code]);
  const findings = useMemo(() => (boardType ? checkBoardType(boardType) : []), [boardType]);
  const dirty = useMemo(() => JSON.stringify(form) !== JSON.stringify(base), [form, base]);

  const looked = useRef(false);
  useEffect(() => {
    if (readOnly) return;
    if (!looked.current) {
      looked.current = true;
      const kept = readKept(keptAs);
      if (kept) {
        const timer = setTimeout(() => {
          setForm(kept.form);
          setVersion(kept.version);
          setRestored(true);
        });
        return () => clearTimeout(timer);
      }
    }
    if (dirty) sessionStorage.setItem(keptAs, JSON.stringify({ version, form } satisfies Kept));
    else sessionStorage.removeItem(keptAs);
  }, [form, version, dirty, keptAs, readOnly]);

  const access: FormAccess = {
    form,
    readOnly,
    sentenceOf: (path) => {
      const sentence = unreadable[path];
      if (sentence) return { sentence, severity: 'error' };
      return findings.find(({ field }) => field === path) ?? null;
    },
    setText: (path, text) => setForm((now) => ({ ...now, texts: { ...now.texts, [path]: text } })),
    settle: (path) => setForm((now) => settled(now, path)),
    change: (part) => setForm((now) => withSides({ ...now, ...part }, now)),
  };
  return {
    access,
    boardType,
    unreadable,
    findings,
    dirty,
    restored: restored && dirty,
    take: (other) => setForm((now) => ({ ...now, texts: { ...now.texts, ...formOf(other).texts } })),
    replace: setForm,
    version,
    saved: (now) => {
      setBase(form);
      setVersion(now);
      setRestored(false);
    },
    revert: () => {
      setForm(base);
      setVersion(opened);
    },
  };
}

interface Kept {
  version: number;
  form: BoardTypeForm;
}

function readKept(keptAs: string): Kept | null {
  try {
    return JSON.parse(sessionStorage.getItem(keptAs) ?? 'null') as Kept | null;
  } catch {
    return null;
  }
}

function settled(form: BoardTypeForm, path: string): BoardTypeForm {
  const field = numberFields(form).find((each) => each.path === path);
  const read = field && readQuantity(form.texts[path] ?? '', field.style);
  if (!field || !read?.ok) return form;
  const turned = field.path.startsWith('trimmer.') && field.style === degreesStyle;
  const text = writeField(field, turned ? read.value / degreesATurn : read.value);
  return text === form.texts[path] ? form : { ...form, texts: { ...form.texts, [path]: text } };
}

/** Another unit of travel, or another way to tell the output's state, keeps or fills the texts that go with it. */
function withSides(form: BoardTypeForm, before: BoardTypeForm): BoardTypeForm {
  const texts = { ...form.texts };
  if (form.travelUnit !== before.travelUnit) {
    const [from, to] = [before, form].map((each) => numberFields(each).find(({ path }) => path === 'trimmer.turns')!);
    const read = readQuantity(texts['trimmer.turns'] ?? '', from!.style);
    if (read.ok)
      texts['trimmer.turns'] = writeField(
        to!,
        before.travelUnit === 'degrees' ? read.value / degreesATurn : read.value,
      );
  }
  const { path } = form.sensing === 'output-voltage' ? thresholdVoltsField : thresholdAmpsField;
  texts[path] ??= '';
  return { ...form, texts };
}
