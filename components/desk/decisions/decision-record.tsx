import { VerdictMark } from '@/components/ui/verdict-mark';
import type { UnitDisposition, UnitSignature } from '@/lib/contracts/unit-page';
import { Time } from '../time';
import { dispositionWords, rejectWords } from '../words';

/** A decision as it was signed: what, why, by whom, when, and what each signature means. */
export function DecisionRecord({ disposition }: { disposition: UnitDisposition }) {
  const { kind, action, reason, signatures, signedByName, signedIso } = disposition;
  const { serials = [], rejectReason = null } = signatures[0] ?? {};
  return (
    <>
      <h3 className="font-bold">{dispositionWords[kind]}</h3>
      {rejectReason ? <p>Rejected: {rejectWords[rejectReason].toLowerCase()}</p> : null}
      {action ? <p>Done: {action}</p> : null}
      <p>Reason: {reason}</p>
      {serials.length > 1 ? (
        <p className="max-h-40 overflow-y-auto text-ink-2" tabIndex={serials.length > 20 ? 0 : undefined}>
          For {serials.length} boards together: <span className="font-num">{serials.join(', ')}</span>
        </p>
      ) : null}
      {signatures.length === 0 ? (
        <p className="mt-1">
          {signedByName}, <Time iso={signedIso} />
        </p>
      ) : (
        <ul>
          {signatures.map((signature) => (
            <li key={signature.digest} className="mt-1">
              <SignatureLine signature={signature} />
            </li>
          ))}
        </ul>
      )}
    </>
  );
}

/** Name, time and meaning; the beginning of the seal tells prints apart. */
export function SignatureLine({ signature }: { signature: UnitSignature }) {
  const { name, signedIso, meaning, digest, holds } = signature;
  return (
    <>
      <span className="block">
        Signed by <b>{name}</b>, <Time iso={signedIso} format="second" />
      </span>
      <q className="block">{meaning}</q>
      <span className="block font-num text-cap text-ink-2">{digest.slice(0, 16)}</span>
      {holds ? null : (
        <span className="flex items-center gap-1.5 font-bold">
          <VerdictMark shape="check" size={14} /> This signature does not fit its record. Tell quality.
        </span>
      )}
    </>
  );
}
