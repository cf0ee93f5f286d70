'use client';

import { FillIn, FillInChoice } from '@/components/ui/fill-in';
import { dryRunSettingsSchema, type DryRunSettings } from '@/lib/contracts/dry-run';

/** The settings as typed: a number half written is kept until it is whole. */
export type TypedSettings = Record<'boards' | 'defects' | 'turnPercent' | 'turnDegrees' | 'seed' | 'station', string>;

export const typedSettings = (settings: DryRunSettings): TypedSettings => ({
  boards: String(settings.boards),
  defects: String(Number((settings.defectRate * 100).toFixed(3))),
  turnPercent: String(Number((settings.turnErrorRelative * 100).toFixed(3))),
  turnDegrees: String(settings.turnErrorDegrees),
  seed: String(settings.seed),
  station: settings.stationCode ?? '',
});

type Parsed = { settings: DryRunSettings } | { field: keyof TypedSettings; sentence: string };
const fieldOf: Record<string, keyof TypedSettings> = {
  boards: 'boards',
  defectRate: 'defects',
  turnErrorRelative: 'turnPercent',
  turnErrorDegrees: 'turnDegrees',
  seed: 'seed',
};

export function parseSettings(typed: TypedSettings): Parsed {
  const number = (text: string) => (text.trim() === '' ? NaN : Number(text.replace(',', '.')));
  const parsed = dryRunSettingsSchema.safeParse({
    boards: number(typed.boards),
    defectRate: number(typed.defects) / 100,
    turnErrorRelative: number(typed.turnPercent) / 100,
    turnErrorDegrees: number(typed.turnDegrees),
    seed: number(typed.seed),
    stationCode: typed.station || null,
  });
  if (parsed.success) return { settings: parsed.data };
  const [issue] = parsed.error.issues;
  const sentence = issue!.code === 'invalid_type' ? 'Enter a number.' : issue!.message;
  return { field: fieldOf[String(issue!.path[0])] ?? 'boards', sentence };
}

interface SettingsSentenceProps {
  typed: TypedSettings;
  onChange(typed: TypedSettings): void;
  stations: readonly { code: string; name: string }[];
  locked: boolean;
  wrong: keyof TypedSettings | null;
  problemId: string;
}

/** What the simulated boards and their operator are like, as a sentence to fill in. */
export function SettingsSentence({ typed, onChange, stations, locked, wrong, problemId }: SettingsSentenceProps) {
  const field = (name: keyof TypedSettings, label: string, className: string) => (
    <FillIn
      label={label}
      value={typed[name]}
      inputMode="decimal"
      disabled={locked}
      aria-invalid={wrong === name || undefined}
      aria-describedby={wrong === name ? problemId : undefined}
      className={`font-num ${className} ${wrong === name ? 'outline-2 outline-reject' : ''} ${locked ? 'border-dashed bg-transparent' : ''}`}
      onChange={(event) => onChange({ ...typed, [name]: event.target.value })}
    />
  );
  const choices = [
    { value: '', label: 'a usual station' },
    ...stations.map(({ code, name }) => ({ value: code, label: name })),
  ];
  return (
    <p className="leading-[2.4]">
      {field('boards', 'Boards', 'w-[4.5em]')} boards, {field('defects', 'Boards with a defect, percent', 'w-[3em]')} %
      with a defect, turned within {field('turnPercent', 'Error of a turn, percent', 'w-[3em]')} % and{' '}
      {field('turnDegrees', 'Error of a turn, degrees', 'w-[3em]')} degrees, at{' '}
      <FillInChoice
        label="Station"
        choices={choices}
        value={typed.station}
        disabled={locked}
        onChange={(event) => onChange({ ...typed, station: event.target.value })}
      />
      , seed {field('seed', 'Seed', 'w-[6em]')}
    </p>
  );
}
