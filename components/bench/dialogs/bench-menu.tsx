import { useTranslations } from 'next-intl';
import { useState, type ReactNode } from 'react';
import { benchLocales } from '@/lib/messages/bench-locales';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { useBench } from '../bench-context';
import { CallButton } from '../call-button';
import { BatchDialog } from './batch-dialog';

interface BenchMenuProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

const schemes = ['day', 'night', 'system'] as const;

/** What is needed now and then: help, another lot, a part batch, light, language, commissioning. */
export function BenchMenu({ open, onOpenChange }: BenchMenuProps) {
  const t = useTranslations('bench.menu');
  const { view, send } = useBench();
  const [batch, setBatch] = useState(false);
  const { operator, lot, station, screen } = view;
  const atRest = !['run', 'bin', 'commissioning'].includes(screen.kind);
  const close = () => onOpenChange(false);
  const act = (command: Parameters<typeof send>[0]) => () => {
    send(command);
    close();
  };
  return (
    <>
      <Dialog size="bench" open={open} onOpenChange={onOpenChange} title={t('title', { station: station.name })}>
        <div className="grid gap-8">
          {operator && (
            <Group>
              <CallButton />
              {lot && (
                <Button
                  size="bench"
                  onClick={() => {
                    close();
                    setBatch(true);
                  }}
                >
                  {t('batch')}
                </Button>
              )}
              {lot && atRest && (
                <Button size="bench" onClick={act({ kind: 'leave-lot' })}>
                  {t('otherLot')}
                </Button>
              )}
              {operator.mayCommission && atRest && (
                <Button size="bench" onClick={act({ kind: 'start-commissioning' })}>
                  {t('commission')}
                </Button>
              )}
            </Group>
          )}
          <Group label={t('light')}>
            {schemes.map((scheme) => (
              <Choice
                key={scheme}
                chosen={station.scheme === scheme}
                label={t(`schemes.${scheme}`)}
                onChoose={act({ kind: 'scheme', scheme })}
              />
            ))}
          </Group>
          {operator && (
            <Group label={t('language')}>
              {benchLocales.map(({ locale, name }) => (
                <Choice
                  key={locale}
                  chosen={operator.locale === locale}
                  label={name}
                  onChoose={act({ kind: 'locale', locale })}
                />
              ))}
            </Group>
          )}
          <Button size="bench" kind="link" data-safe="" className="justify-self-start" onClick={close}>
            {t('back')}
          </Button>
        </div>
      </Dialog>
      <BatchDialog open={batch} onOpenChange={setBatch} />
    </>
  );
}

function Group({ label, children }: { label?: string; children: ReactNode }) {
  return (
    <div role="group" aria-label={label}>
      {label && <p className="mb-2 text-b-label text-ink-2">{label}</p>}
      <div className="flex flex-wrap gap-(--sw-bench-gap)">{children}</div>
    </div>
  );
}

function Choice({ chosen, label, onChoose }: { chosen: boolean; label: string; onChoose: () => void }) {
  return (
    <Button
      size="bench"
      aria-pressed={chosen}
      className={chosen ? '!border-ink !bg-ink !text-paper' : ''}
      onClick={onChoose}
    >
      {label}
    </Button>
  );
}
