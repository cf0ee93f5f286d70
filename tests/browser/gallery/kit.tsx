import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { ChoiceField } from '@/components/ui/choice-field';
import { Dialog } from '@/components/ui/dialog';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorPanel } from '@/components/ui/error-panel';
import { FillIn, FillInChoice } from '@/components/ui/fill-in';
import { HoldPanel } from '@/components/ui/hold-panel';
import { LoadingTicks } from '@/components/ui/loading-ticks';
import { LotRule } from '@/components/ui/lot-rule';
import { Mark } from '@/components/ui/mark';
import { MiniGauge } from '@/components/ui/mini-gauge';
import { Notice } from '@/components/ui/notice';
import { PageHead, Section, Toolbar } from '@/components/ui/page-head';
import { PointMark } from '@/components/ui/point-mark';
import { SelectField } from '@/components/ui/select-field';
import { SerialStrip } from '@/components/ui/serial-strip';
import { StepLine } from '@/components/ui/step-line';
import { Table, Td, Th } from '@/components/ui/table';
import { TextField } from '@/components/ui/text-field';
import { ToastProvider, useToast } from '@/components/ui/toast';
import { VerdictMark } from '@/components/ui/verdict-mark';

/** Every primitive of the desk, for looking. */
export function Kit() {
  return (
    <ToastProvider>
      <main className="px-12 py-6 max-sm:px-[18px]">
        <PageHead
          title={
            <span className="flex items-center gap-4">
              <Mark /> Kit
            </span>
          }
          lede="Every primitive, as it stands on a desk page."
          actions={<Opens />}
        />
        <Toolbar count="12 of 240">
          Show
          <FillInChoice label="State" choices={[{ value: 'r', label: 'rejected' }]} /> boards of{' '}
          <FillIn label="Lot" defaultValue="2648-B" size={8} />
        </Toolbar>
        <Section title="Verdicts and marks">
          <p className="flex flex-wrap gap-6">
            <b className="text-pass">
              <VerdictMark shape="pass" /> Passed
            </b>
            <b className="text-reject">
              <VerdictMark shape="reject" /> Rejected
            </b>
            <b>
              <VerdictMark shape="check" /> Check
            </b>
            <b>
              <VerdictMark shape="hold" /> On hold
            </b>
            <b className="text-trip">
              <PointMark point="trip" /> Trip
            </b>
            <b className="text-release">
              <PointMark point="release" /> Release
            </b>
          </p>
        </Section>
        <Section title="Buttons">
          <p className="flex flex-wrap gap-4">
            <Button kind="filled">Release the hold</Button>
            <Button>Keep on hold</Button>
            <Button kind="link">Cancel</Button>
            <Button unavailable="A second person must release it.">Not yet</Button>
            <Button kind="stop">Stop</Button>
          </p>
        </Section>
        <Section title="Fields">
          <div className="grid max-w-160 grid-cols-2 gap-4 max-sm:grid-cols-1">
            <TextField label="Step size" defaultValue="10" unit="mV" mono />
            <TextField
              label="Wait at each step"
              defaultValue="2"
              unit="ms"
              mono
              error="Use 3.6 ms or more. The output must settle."
            />
            <TextField
              label="Guard"
              defaultValue="0.02"
              unit="V"
              mono
              warning="Smaller than the uncertainty, 0.024 V."
            />
            <SelectField label="Board type" choices={[{ value: 'a', label: 'CB1210' }]} />
            <CheckField label="Wiper probe fitted" defaultChecked />
            <ChoiceField
              legend="Your signature means"
              name="meaning"
              defaultValue="a"
              choices={[
                { value: 'a', label: 'checked and released' },
                { value: 'b', label: 'checked, not released' },
              ]}
            />
          </div>
        </Section>
        <Section title="Messages">
          <div className="grid gap-3">
            <Notice>Label printer is out of paper. Testing goes on.</Notice>
            <HoldPanel title="On hold" actions={<Button kind="filled">Test the 40 boards again</Button>}>
              Trip points drift upward: <b>10</b> boards in a row above centre.
            </HoldPanel>
            <EmptyState title="No boards tested yet.">The first one appears here as soon as it is scanned.</EmptyState>
            <LoadingTicks label="Reading 240 records, 98 done" done={98} of={240} />
            <ErrorPanel
              title="The records did not load."
              action={
                <a className="sw-link" href="#again">
                  Try again
                </a>
              }
            >
              The station keeps testing.
            </ErrorPanel>
          </div>
        </Section>
        <Section title="Lot, steps, serial">
          <LotRule marks="PPWPPRPPNPPPC......." label="12 of 20 boards tested" />
          <StepLine
            label="Steps"
            steps={[
              { key: 'a', label: 'Seat', state: 'done' },
              { key: 'b', label: 'Trim', state: 'current' },
              { key: 'c', label: 'Verify', state: 'ahead' },
            ]}
          />
          <p className="mt-4 text-title">
            <SerialStrip serial="CB1210264800184" boardTypeCode="CB1210" />
          </p>
        </Section>
        <Section title="Rejected boards">
          <Table>
            <thead>
              <tr>
                <Th>Serial</Th>
                <Th>Reason</Th>
                <Th number>Measured</Th>
                <Th>Against limits</Th>
              </tr>
            </thead>
            <tbody>
              {[12.55, 12.3, 1.1].map((value) => (
                <tr key={value}>
                  <Td label="Serial">
                    <SerialStrip serial="CB1210264800122" />
                  </Td>
                  <Td label="Reason">Release too high</Td>
                  <Td label="Measured" number>
                    {value} V
                  </Td>
                  <Td label="Against limits">
                    <MiniGauge value={value} min={12.1} max={12.5} tone="release" label={`${value} V`} />
                  </Td>
                </tr>
              ))}
            </tbody>
          </Table>
        </Section>
      </main>
    </ToastProvider>
  );
}

function Opens() {
  const [open, setOpen] = useState(false);
  const toast = useToast();
  return (
    <>
      <Button onClick={() => toast('3 boards sent to rework', () => {})}>Toast</Button>
      <Button kind="filled" onClick={() => setOpen(true)}>
        Release lot…
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title="Release lot 2648-B?"
        consequence="40 boards have not been tested again. They will be free to ship."
        actions={
          <>
            <Button kind="filled">Release the lot</Button>
            <Button kind="link" data-safe="" onClick={() => setOpen(false)}>
              Keep it on hold
            </Button>
          </>
        }
      />
    </>
  );
}
