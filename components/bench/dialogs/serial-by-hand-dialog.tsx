import { useTranslations } from 'next-intl';
import { useState, type FormEvent } from 'react';
import { benchCommandSchema } from '@/lib/contracts/bench-command';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { useBench } from '../bench-context';
import { BenchField } from './bench-field';

interface SerialByHandDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

const empty = { serial: '', again: '' };

/** For a label that cannot be read: the serial number is typed twice and compared, here and at the server. */
export function SerialByHandDialog({ open, onOpenChange }: SerialByHandDialogProps) {
  const t = useTranslations('bench.serialByHand');
  const { send } = useBench();
  const [typed, setTyped] = useState(empty);
  const [problem, setProblem] = useState<'form' | 'differ' | null>(null);
  const close = () => {
    setTyped(empty);
    setProblem(null);
    onOpenChange(false);
  };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const serial = typed.serial.trim().toUpperCase();
    const again = typed.again.trim().toUpperCase();
    const parsed = benchCommandSchema.safeParse({ kind: 'serial-by-hand', serial, again });
    if (!parsed.success) return setProblem('form');
    if (serial !== again) return setProblem('differ');
    send(parsed.data);
    close();
  };
  const field = (name: 'serial' | 'again') => ({
    name,
    value: typed[name],
    onPaste: (event: { preventDefault: () => void }) => event.preventDefault(),
    onChange: (event: { target: { value: string } }) => {
      setTyped({ ...typed, [name]: event.target.value });
      setProblem(null);
    },
  });
  return (
    <Dialog
      size="bench"
      focus="first-field"
      open={open}
      onOpenChange={(next) => (next ? onOpenChange(true) : close())}
      title={t('title')}
      consequence={t('consequence')}
    >
      <form onSubmit={submit} className="grid gap-6">
        <BenchField label={t('serial')} error={problem === 'form' ? t('form') : null} {...field('serial')} />
        <BenchField label={t('again')} error={problem === 'differ' ? t('differ') : null} {...field('again')} />
        <div className="mt-3 flex flex-wrap gap-(--sw-bench-gap)">
          <Button size="bench" kind="filled" type="submit">
            {t('submit')}
          </Button>
          <Button size="bench" kind="link" data-safe="" onClick={close}>
            {t('back')}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
