/** Internet Printing Protocol messages: encoding of RFC 8010, operations and states of RFC 8011. */

export const ippOperations = {
  printJob: 0x0002,
  cancelJob: 0x0008,
  getJobAttributes: 0x0009,
  getPrinterAttributes: 0x000b,
} as const;

export const groupTags = { operation: 0x01, job: 0x02, printer: 0x04, unsupported: 0x05 } as const;
const endOfAttributes = 0x03;
/** Tags below this one begin a group (RFC 8010, 3.5.1). */
const firstValueTag = 0x10;

export const valueTags = {
  integer: 0x21,
  boolean: 0x22,
  enum: 0x23,
  text: 0x41,
  name: 0x42,
  keyword: 0x44,
  uri: 0x45,
  charset: 0x47,
  language: 0x48,
  mimeType: 0x49,
} as const;

export type IppValue = string | number | boolean;

export interface IppAttribute {
  name: string;
  tag: number;
  values: IppValue[];
}

export interface IppMessage {
  /** Operation of a request, status of a response. */
  code: number;
  requestId: number;
  groups: { tag: number; attributes: IppAttribute[] }[];
  /** The document, or empty. */
  data: Buffer;
}

const int16 = (value: number) => {
  const bytes = Buffer.alloc(2);
  bytes.writeUInt16BE(value);
  return bytes;
};
const int32 = (value: number) => {
  const bytes = Buffer.alloc(4);
  bytes.writeInt32BE(value);
  return bytes;
};

function valueBytes(value: IppValue): Buffer {
  if (typeof value === 'number') return int32(value);
  if (typeof value === 'boolean') return Buffer.from([value ? 1 : 0]);
  return Buffer.from(value, 'utf8');
}

function attributeBytes({ name, tag, values }: IppAttribute): Buffer {
  return Buffer.concat(
    values.flatMap((value, i) => {
      // Further values of one attribute carry an empty name.
      const nameBytes = Buffer.from(i === 0 ? name : '', 'ascii');
      const bytes = valueBytes(value);
      return [Buffer.from([tag]), int16(nameBytes.length), nameBytes, int16(bytes.length), bytes];
    }),
  );
}

/** Version 1.1, which every printer of RFC 8010 must accept. */
export function encodeIpp(message: IppMessage): Buffer {
  return Buffer.concat([
    Buffer.from([1, 1]),
    int16(message.code),
    int32(message.requestId),
    ...message.groups.flatMap((group) => [Buffer.from([group.tag]), ...group.attributes.map(attributeBytes)]),
    Buffer.from([endOfAttributes]),
    message.data,
  ]);
}

function readValue(tag: number, bytes: Buffer): IppValue {
  if ((tag === valueTags.integer || tag === valueTags.enum) && bytes.length === 4) return bytes.readInt32BE();
  if (tag === valueTags.boolean) return bytes[0] === 1;
  return bytes.toString('utf8');
}

/** Null when the bytes are cut off or are not a message. */
export function decodeIpp(bytes: Buffer): IppMessage | null {
  let at = 8;
  const take = (count: number) => {
    if (at + count > bytes.length) throw new RangeError('cut off');
    at += count;
    return bytes.subarray(at - count, at);
  };
  const message: IppMessage = { code: 0, requestId: 0, groups: [], data: Buffer.alloc(0) };
  try {
    message.code = bytes.readUInt16BE(2);
    message.requestId = bytes.readInt32BE(4);
    for (;;) {
      const tag = take(1)[0]!;
      if (tag === endOfAttributes) break;
      if (tag < firstValueTag) {
        message.groups.push({ tag, attributes: [] });
        continue;
      }
      const name = take(take(2).readUInt16BE()).toString('ascii');
      const value = readValue(tag, take(take(2).readUInt16BE()));
      const attributes = message.groups.at(-1)?.attributes;
      if (!attributes) return null;
      if (name === '') attributes.at(-1)?.values.push(value);
      else attributes.push({ name, tag, values: [value] });
    }
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
  message.data = bytes.subarray(at);
  return message;
}

/** First group of that tag, first attribute of that name. */
export function findAttribute(message: IppMessage, groupTag: number, name: string): IppAttribute | undefined {
  return message.groups
    .filter((group) => group.tag === groupTag)
    .flatMap((group) => group.attributes)
    .find((attribute) => attribute.name === name);
}
