import { useTranslations } from 'next-intl';
import { useState, type FormEvent } from 'react';
import { benchCommandSchema } from '@/lib/contracts/bench-command';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { useBench } from '../bench-context';
import { BenchField } from './bench-field';

interface BatchDialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

/** A new reel or tray of a part is in use: recorded with the lot from now on. */
export function BatchDialog({ open, onOpenChange }: BatchDialogProps) {
  const t = useTranslations('bench.batch');
  const { send } = useBench();
  const [typed, setTyped] = useState({ component: '', batch: '' });
  const [wrong, setWrong] = useState<'component' | 'batch' | null>(null);
  const close = () => {
    setTyped({ component: '', batch: '' });
    setWrong(null);
    onOpenChange(false);
  };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const command = { kind: 'component-batch', component: typed.component.trim(), batch: typed.batch.trim() };
    const parsed = benchCommandSchema.safeParse(command);
    if (!parsed.success) return setWrong(command.component ? 'batch' : 'component');
    send(parsed.data);
    close();
  };
  const field = (name: 'component' | 'batch') => ({
    name,
    value: typed[name],
    error: wrong === name ? t('form') : null,
    onChange: (event: { target: { value: string } }) => {
      setTyped({ ...typed, [name]: event.target.value });
      setWrong(null);
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
        <BenchField label={t('component')} {...field('component')} />
        <BenchField label={t('batchNumber')} {...field('batch')} />
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
