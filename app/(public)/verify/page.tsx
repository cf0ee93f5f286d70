import { CodeForm } from '@/components/verify/code-form';
import { VerifyFrame } from '@/components/verify/verify-frame';

export default function VerifyPage() {
  return (
    <VerifyFrame
      shape={null}
      title="Is this certificate valid?"
      under="Scan the square on the paper, or type its code."
    >
      <div className="mt-5">
        <CodeForm />
      </div>
    </VerifyFrame>
  );
}
