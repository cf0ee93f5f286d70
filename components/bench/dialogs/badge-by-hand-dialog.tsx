import { useTranslations } from 'next-intl';
import { useState, type FormEvent } from 'react';
import { benchCommandSchema } from '@/lib/contracts/bench-command';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { useBench } from '../bench-context';
import { BenchField } from './bench-field';

interface BadgeByHandDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

/** For a badge that was left at home: its number is typed; the PIN is asked all the same. */
export function BadgeByHandDialog({ open, onOpenChange }: BadgeByHandDialogProps) {
  const t = useTranslations('bench.badgeByHand');
  const { send } = useBench();
  const [number, setNumber] = useState('');
  const [wrong, setWrong] = useState(false);
  const close = () => {
    setNumber('');
    setWrong(false);
    onOpenChange(false);
  };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const parsed = benchCommandSchema.safeParse({ kind: 'badge-by-hand', number: number.trim() });
    if (!parsed.success) return setWrong(true);
    send(parsed.data);
    close();
  };
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
        <BenchField
          label={t('number')}
          name="number"
          value={number}
          error={wrong ? t('form') : null}
          onChange={(event) => {
            setNumber(event.target.value);
            setWrong(false);
          }}
        />
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
