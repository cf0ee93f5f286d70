import { splitSerial } from './split-serial';

/** A serial number as people read it: prefix light, the last five heavy. Takes the text's size. */
export function SerialStrip({ serial }: { serial: string }) {
  const { groups, tail } = splitSerial(serial);
  return (
    <span className="font-num whitespace-nowrap" aria-label={serial}>
      <span aria-hidden="true">
        {groups.map((group) => (
          <span key={group} className="mr-[0.45em] text-ink-2">
            {group}
          </span>
        ))}
        <b>{tail}</b>
      </span>
    </span>
  );
}
