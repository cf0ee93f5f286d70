import { serialGroups } from '@/lib/barcode/serial-groups';

/** A serial number as people read it: what comes first light, the last five heavy. Takes the text's size. */
export function SerialStrip({ serial, boardTypeCode }: { serial: string; boardTypeCode?: string }) {
  const groups = serialGroups(serial, boardTypeCode);
  return (
    <span className="font-num whitespace-nowrap">
      <span className="sw-only-read">{serial}</span>
      <span aria-hidden="true">
        {groups.slice(0, -1).map((group) => (
          <span key={group} className="mr-[0.45em] text-ink-2">
            {group}
          </span>
        ))}
        <b>{groups.at(-1)}</b>
      </span>
    </span>
  );
}
