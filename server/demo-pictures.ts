import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { findAccountByEmail } from '@/db/queries/accounts';
import { findFile, insertFile } from '@/db/queries/files';
import { demoAccounts } from '@/db/seed/demo-accounts';
import { demoDrawingId, demoPhotoId } from '@/db/seed/demo-pictures';
import type { FileKind } from '@/lib/contracts/stored-states';
import { encodePicture } from './files/storage/encode-picture';
import { objectStore } from './files/storage/object-store';
import { database } from './postgres';

const pictures: { id: string; kind: FileKind; name: string; draw: () => string }[] = [
  { id: demoPhotoId, kind: 'trimmer-photo', name: 'CB1210 from above.png', draw: boardFromAbove },
  { id: demoDrawingId, kind: 'fixture-drawing', name: 'Fixture of CB1210.png', draw: fixture },
];

/** Stores the demo's own pictures where they are missing: CB1210 from above, and its fixture. */
export async function storeDemoPictures(): Promise<void> {
  const db = database();
  const store = objectStore();
  const engineer = demoAccounts.find(({ email, roles }) => email && roles.includes('test-engineer'));
  const uploader = engineer?.email ? await findAccountByEmail(db, engineer.email) : null;
  if (!store || !uploader) return;
  for (const { id, kind, name, draw } of pictures) {
    if (await findFile(db, id)) continue;
    const picture = await encodePicture(await sharp(Buffer.from(draw())).png().toBuffer());
    if (!picture || picture === 'too-many-pixels') continue;
    const { bytes, mediaType, width, height } = picture;
    const storageKey = `${kind}/${id}`;
    await store.put(storageKey, bytes, mediaType);
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    const facts = { mediaType, width, height, bytes: bytes.length, sha256, originalName: name };
    await db.transaction((tx) => insertFile(tx, { id, kind, storageKey, ...facts, uploadedBy: uploader.id }));
  }
}

const hole = (x: number, y: number) =>
  `<circle cx="${x}" cy="${y}" r="26" fill="#c9a24a"/><circle cx="${x}" cy="${y}" r="15" fill="#10150f"/>`;
const resistor = (x: number, y: number) =>
  `<g><rect x="${x}" y="${y + 14}" width="120" height="4" fill="#b9b9b4"/><rect x="${x + 22}" y="${y}" width="76" height="32" rx="12" fill="#cdb98c"/><path d="M${x + 40} ${y}v32M${x + 56} ${y}v32M${x + 80} ${y}v32" stroke="#6b3d1d" stroke-width="7"/></g>`;

function boardFromAbove(): string {
  return `<svg xmlns="http://www.w3.org/2000/svg" width="1280" height="800" viewBox="0 0 1280 800">
    <rect width="1280" height="800" fill="#3a3c40"/>
    <rect x="60" y="50" width="1160" height="700" fill="#1f5a38"/>
    <g fill="none" stroke="#2d7a4e" stroke-width="10"><path d="M120 640H620V420H760M120 690H1100V300M300 180H520V330H800M300 120H1000"/></g>
    ${hole(110, 100)}${hole(1170, 100)}${hole(110, 700)}${hole(1170, 700)}
    <rect x="150" y="90" width="230" height="110" fill="#2a6fb0"/><g fill="#d9d9d4">${[195, 265, 335].map((x) => `<circle cx="${x}" cy="145" r="24"/>`).join('')}</g>
    <circle cx="330" cy="450" r="105" fill="#23262b"/><circle cx="330" cy="450" r="84" fill="#b9bcc0"/><path d="M262 402a84 84 0 0 1 60-36l8 84z" fill="#8b8e93"/>
    <rect x="560" y="430" width="150" height="110" fill="#1a1b1e"/><circle cx="580" cy="452" r="8" fill="#555"/>
    ${[580, 615, 650, 685].map((x) => `<path d="M${x} 430v-26M${x} 540v26" stroke="#c8c8c2" stroke-width="11"/>`).join('')}
    ${resistor(480, 240)}${resistor(480, 310)}${resistor(880, 520)}${resistor(880, 590)}${resistor(560, 630)}
    <rect x="830" y="180" width="160" height="190" fill="#2f57b8"/><rect x="842" y="192" width="136" height="166" fill="#3b68cf"/>
    <circle cx="910" cy="262" r="46" fill="#d3ab52"/><circle cx="910" cy="262" r="46" fill="none" stroke="#8d6d27" stroke-width="5"/><path d="M882 290l56-56" stroke="#5e4818" stroke-width="13"/>
    <rect x="1040" y="470" width="120" height="150" fill="#24262a"/><rect x="1040" y="440" width="120" height="36" fill="#a9acb0"/>
    <g fill="#e9ece4" font-family="monospace" font-size="30"><text x="850" y="410">RV1</text><text x="600" y="595">U1</text><text x="290" y="600">C1</text><text x="700" y="120">CB1210</text></g>
  </svg>`;
}

function fixture(): string {
  const nails = [
    [330, 190, 'supply + sense'],
    [330, 250, 'supply +'],
    [330, 430, 'supply −'],
    [330, 490, 'supply − sense'],
    [640, 340, '101 supply'],
    [640, 400, '102 output'],
    [640, 460, '103 reference'],
  ] as const;
  return `<svg xmlns="http://www.w3.org/2000/svg" width="1200" height="760" viewBox="0 0 1200 760">
    <rect width="1200" height="760" fill="#fff"/>
    <g fill="none" stroke="#17191e" stroke-width="4"><rect x="120" y="80" width="920" height="560"/><rect x="280" y="140" width="600" height="420" stroke-dasharray="14 10"/><circle cx="690" cy="240" r="34"/><path d="M690 190v100M640 240h100M120 690h920M120 676v28M1040 676v28M1080 80v560M1066 80h28M1066 640h28"/><path d="M160 80V50h120v30M880 80V50h120v30"/></g>
    <g fill="#17191e" font-family="sans-serif" font-size="24">
      ${nails.map(([x, y, name]) => `<circle cx="${x}" cy="${y}" r="9"/><text x="${x + 22}" y="${y + 8}">${name}</text>`).join('')}
      <text x="560" y="190">hole in the lid for the screw</text><text x="300" y="600">board CB1210, parts up</text>
      <text x="540" y="672">230 mm</text><text x="1092" y="370">140 mm</text><text x="140" y="738">Fixture of CB1210, lid seen from above. Nails pass through the base.</text>
    </g>
  </svg>`;
}
