import { createTranslator } from 'next-intl';
import { describe, expect, it } from 'vitest';
import { benchSayings } from '@/lib/bench/sayings';
import { defectKinds } from '@/lib/contracts/bench-command';
import de from '@/lib/messages/de.json';
import en from '@/lib/messages/en.json';
import { runSayings } from '@/lib/run/sayings';
import { likelyCauses, noVerdictReasons, rejectReasons } from '@/lib/run/types';
import { stepGroups } from '@/lib/sequence/step';
import { trimFindings } from '@/lib/trim/types';
import { messageArguments } from './message-arguments';

type Tree = { [key: string]: string | Tree };

function flat(tree: Tree, path = ''): Map<string, string> {
  const all = new Map<string, string>();
  for (const [key, value] of Object.entries(tree)) {
    if (typeof value === 'string') all.set(path + key, value);
    else for (const [inner, text] of flat(value, `${path}${key}.`)) all.set(inner, text);
  }
  return all;
}

const languages = { en: flat(en), de: flat(de) };

describe('the catalogue of the bench', () => {
  it('has the same keys in both languages', () => {
    expect([...languages.de.keys()].sort()).toEqual([...languages.en.keys()].sort());
  });

  it('takes the same arguments in both languages', () => {
    for (const [key, text] of languages.en) {
      expect([key, [...messageArguments(languages.de.get(key)!)].sort()]).toEqual([
        key,
        [...messageArguments(text)].sort(),
      ]);
    }
  });

  it.each(Object.entries(languages))('has no empty text and no exclamation mark in %s', (_, texts) => {
    for (const [key, text] of texts) {
      expect(text.trim(), key).not.toBe('');
      expect(text, key).not.toContain('!');
    }
  });

  it.each(Object.entries(languages))('uses no sign that the shipped faces lack in %s', (_, texts) => {
    for (const [key, text] of texts) expect(text, key).not.toMatch(/[Ω→←↑↓▲▼⅛⅜⅝⅞]/);
  });

  it.each(Object.entries(languages))('has a sentence for every code of a run in %s', (_, texts) => {
    const wanted = [
      ...rejectReasons.map((reason) => `reject.${reason}`),
      ...likelyCauses.map((cause) => `cause.${cause}`),
      ...noVerdictReasons.flatMap((reason) => ['title', 'text', 'next'].map((part) => `noVerdict.${reason}.${part}`)),
      ...trimFindings.flatMap((finding) =>
        ['title', 'fact', 'move'].map((part) => `bench.findings.${finding}.${part}`),
      ),
      ...stepGroups.map((group) => `bench.steps.groups.${group}`),
      ...defectKinds.map((kind) => `hands.defects.${kind}`),
      'say.no-connection',
    ];
    expect(wanted.filter((key) => !texts.has(key))).toEqual([]);
  });

  describe.each([
    ['en', en],
    ['de', de],
  ] as const)('says everything that a station can say in %s', (locale, messages) => {
    const sayings: Record<string, readonly string[]> = { ...benchSayings, ...runSayings };

    it.each(Object.entries(sayings))('%s', (code, names) => {
      const problems: string[] = [];
      const translate = createTranslator({
        locale,
        messages: messages as never,
        namespace: 'say' as never,
        onError: (error) => problems.push(error.message),
      }) as unknown as (key: string, params: Record<string, string | number>) => string;
      const params = Object.fromEntries(names.map((name, i) => [name, /volts/i.test(name) ? 10.5 + i : `value${i}`]));
      const text = translate(code, params);
      expect(problems).toEqual([]);
      expect(text).not.toContain('{');
      const used = messageArguments(flat(messages.say).get(code)!);
      expect([...used].filter((name) => !names.includes(name))).toEqual([]);
    });
  });
});
