import type { ReactNode } from 'react';
import { Mark } from '@/components/ui/mark';
import { VerdictMark, type VerdictShape } from '@/components/ui/verdict-mark';

interface VerifyFrameProps {
  shape: VerdictShape | null;
  title: string;
  under?: ReactNode;
  children: ReactNode;
}

/** A page for whoever holds a paper: on a phone first, without menu or account. */
export function VerifyFrame({ shape, title, under, children }: VerifyFrameProps) {
  return (
    <>
      <header className="border-b-2 border-ink px-[18px] py-3">
        <p className="mx-auto flex max-w-[560px] items-center gap-3 text-[19px] font-bold">
          <Mark size={26} />
          Sillwright
        </p>
      </header>
      <main className="mx-auto max-w-[596px] px-[18px] pt-5 pb-14 text-[17px]">
        <div className="flex items-center gap-4 border-b-2 border-ink pb-4">
          {shape ? <VerdictMark shape={shape} size={62} /> : null}
          <div>
            <h1 className="text-[26px] leading-tight font-bold">{title}</h1>
            {under ? <p className="text-ink-2">{under}</p> : null}
          </div>
        </div>
        {children}
      </main>
    </>
  );
}
