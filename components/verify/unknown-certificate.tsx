import { Advice, callTheMaker } from './advice';
import { CodeForm } from './code-form';
import { VerifyFrame } from './verify-frame';

/** Nothing was issued under the code that was asked for. */
export function UnknownCertificate() {
  return (
    <VerifyFrame shape="reject" title="No such certificate">
      <p className="border-b-2 border-ink py-4">
        Nothing was issued under this code. A letter may be misread, or the paper is not ours.
      </p>
      <div className="mt-5">
        <CodeForm />
      </div>
      <Advice
        steps={[
          'Scan the square on the paper again, or compare every letter: capitals count.',
          `If it still fails: ${callTheMaker.charAt(0).toLowerCase()}${callTheMaker.slice(1)}`,
        ]}
      />
      <p className="mt-6 text-cap text-ink-3">
        This page shows only what is printed on a certificate. It keeps no record of who looked.
      </p>
    </VerifyFrame>
  );
}
