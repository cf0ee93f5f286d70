import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { httpUrlOf } from '@/server/files/printing/ipp-client';
import {
  decodeIpp,
  encodeIpp,
  groupTags,
  ippOperations,
  valueTags,
  type IppMessage,
} from '@/server/files/printing/ipp-message';

// RFC 8010, appendix A.1: the Print-Job request, octet by octet.
const printJob: IppMessage = {
  code: ippOperations.printJob,
  requestId: 1,
  groups: [
    {
      tag: groupTags.operation,
      attributes: [
        { name: 'attributes-charset', tag: valueTags.charset, values: ['utf-8'] },
        { name: 'attributes-natural-language', tag: valueTags.language, values: ['en-us'] },
        { name: 'printer-uri', tag: valueTags.uri, values: ['ipp://printer.example.com/ipp/print/pinetree'] },
        { name: 'job-name', tag: valueTags.name, values: ['foobar'] },
        { name: 'ipp-attribute-fidelity', tag: valueTags.boolean, values: [true] },
      ],
    },
    {
      tag: groupTags.job,
      attributes: [
        { name: 'copies', tag: valueTags.integer, values: [20] },
        { name: 'sides', tag: valueTags.keyword, values: ['two-sided-long-edge'] },
      ],
    },
  ],
  data: Buffer.from('%!PS'),
};
const ascii = (text: string) => Buffer.from(text).toString('hex');
const printJobOctets = [
  '0101 0002 00000001 01',
  `47 0012 ${ascii('attributes-charset')} 0005 ${ascii('utf-8')}`,
  `48 001b ${ascii('attributes-natural-language')} 0005 ${ascii('en-us')}`,
  `45 000b ${ascii('printer-uri')} 002c ${ascii('ipp://printer.example.com/ipp/print/pinetree')}`,
  `42 0008 ${ascii('job-name')} 0006 ${ascii('foobar')}`,
  `22 0016 ${ascii('ipp-attribute-fidelity')} 0001 01`,
  `02 21 0006 ${ascii('copies')} 0004 00000014`,
  `44 0005 ${ascii('sides')} 0013 ${ascii('two-sided-long-edge')}`,
  `03 ${ascii('%!PS')}`,
]
  .join('')
  .replaceAll(' ', '');

describe('an IPP message', () => {
  it('has the octets of RFC 8010, appendix A.1', () => {
    expect(encodeIpp(printJob).toString('hex')).toBe(printJobOctets);
  });

  it('is read back from those octets', () => {
    expect(decodeIpp(Buffer.from(printJobOctets, 'hex'))).toEqual(printJob);
  });

  it('carries several values of one attribute under an empty name', () => {
    const attributes = [{ name: 'requested-attributes', tag: valueTags.keyword, values: ['printer-state', 'x'] }];
    const message = { ...printJob, groups: [{ tag: groupTags.operation, attributes }] };
    expect(decodeIpp(encodeIpp(message))).toEqual(message);
  });

  it('is null when cut off anywhere before the end of its attributes', () => {
    const bytes = encodeIpp({ ...printJob, data: Buffer.alloc(0) });
    for (let length = 0; length < bytes.length; length++) expect(decodeIpp(bytes.subarray(0, length))).toBeNull();
  });

  it('never throws on noise', () => {
    fc.assert(fc.property(fc.uint8Array({ maxLength: 200 }), (noise) => void decodeIpp(Buffer.from(noise))));
  });
});

describe('the address of a printer', () => {
  it.each([
    ['ipp://printer.example/ipp/print', 'http://printer.example:631/ipp/print'],
    ['ipps://printer.example/ipp/print', 'https://printer.example:631/ipp/print'],
    ['ipp://127.0.0.1:6310/ipp/print', 'http://127.0.0.1:6310/ipp/print'],
    ['ipp://printer.example:80/x', 'http://printer.example/x'],
  ])('%s is reached at %s', (uri, url) => {
    expect(httpUrlOf(uri)?.href).toBe(url);
  });

  it('is null for anything else', () => {
    expect(httpUrlOf('lpd://printer/queue')).toBeNull();
  });
});
