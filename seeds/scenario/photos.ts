import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { photos } from '@/db/schema/collection';
import { withScope } from '@/db/scope';
import type { PhotoId } from '@/lib/contracts/ids';
import { openStorage } from '@/lib/services/file-storage';
import { prepareImage } from '@/lib/services/images';
import { smallKey } from '@/lib/use-cases/collection/add-photo';
import { dayFromNow } from '../calendar';
import { identify } from '../identify';
import { makeRandom } from '../random';
import { animalIdOf } from './collection';
import { workspaceId } from './house';
import { phenotypeOf, type Simulated } from './simulate';

interface Colours {
  ground: string;
  blotch: string;
  edge: string;
}

/** Colours by what an animal shows; the first that fits. */
const palettes: [shown: string, colours: Colours][] = [
  ['Piebald', { ground: '#efe6d6', blotch: '#7a4a26', edge: '#2d1c12' }],
  ['Clown', { ground: '#c9964f', blotch: '#5a3519', edge: '#2a1a10' }],
  ['Pastel', { ground: '#dcb45a', blotch: '#6b4a24', edge: '#33251a' }],
  ['Coral Glow', { ground: '#e8b48c', blotch: '#b77aa0', edge: '#84567a' }],
  ['Amelanistic', { ground: '#eda45c', blotch: '#cf4f2c', edge: '#f6dcc2' }],
  ['Anerythristic', { ground: '#b9b6b0', blotch: '#5f5d5b', edge: '#242424' }],
  ['Lavender', { ground: '#c3aeb4', blotch: '#7f6573', edge: '#54414f' }],
];
const usual: Record<Simulated['species']['prefix'], Colours> = {
  BP: { ground: '#a9793f', blotch: '#3a2415', edge: '#1b120c' },
  CS: { ground: '#c98a4b', blotch: '#9c3d22', edge: '#2a1711' },
};

function coloursOf(animal: Simulated): Colours {
  const shown = animal.species.catalogue.loci.map((locus) => phenotypeOf(animal, locus));
  return palettes.find(([name]) => shown.includes(name))?.[1] ?? usual[animal.species.prefix];
}

/** A drawn stretch of skin: rows of scales under blotches, the same each time for an animal. */
function drawSkin(animal: Simulated): string {
  const random = makeRandom([...animal.code].reduce((sum, sign) => sum * 31 + sign.charCodeAt(0), 7));
  const { ground, blotch, edge } = coloursOf(animal);
  const blotches = Array.from({ length: 9 }, (_, index) => {
    const x = 40 + index * 90 + random() * 30;
    const y = 190 + random() * 220;
    const width = 34 + random() * 34;
    const height = 60 + random() * 90;
    return `<ellipse cx="${x.toFixed(0)}" cy="${y.toFixed(0)}" rx="${width.toFixed(0)}" ry="${height.toFixed(0)}" fill="${blotch}" stroke="${edge}" stroke-width="9"/>`;
  });
  return `<svg xmlns="http://www.w3.org/2000/svg" width="800" height="600" viewBox="0 0 800 600">
    <defs>
      <pattern id="scales" width="28" height="20" patternUnits="userSpaceOnUse">
        <path d="M0 10 L14 1 L28 10 L14 19 Z" fill="none" stroke="${edge}" stroke-opacity="0.35" stroke-width="1.5"/>
      </pattern>
      <linearGradient id="round" x1="0" y1="0" x2="0" y2="1">
        <stop offset="0" stop-color="#000" stop-opacity="0.5"/>
        <stop offset="0.4" stop-color="#fff" stop-opacity="0.15"/>
        <stop offset="1" stop-color="#000" stop-opacity="0.55"/>
      </linearGradient>
    </defs>
    <rect width="800" height="600" fill="${ground}"/>
    ${blotches.join('')}
    <rect width="800" height="600" fill="url(#scales)"/>
    <rect width="800" height="600" fill="url(#round)"/>
  </svg>`;
}

/** A picture for each of the animals, drawn for the demo and kept as an uploaded one would be. */
export async function addPhotos(animals: readonly Simulated[], now: Date): Promise<void> {
  const storage = openStorage();
  for (const animal of animals) {
    const drawn = await sharp(Buffer.from(drawSkin(animal)))
      .jpeg({ quality: 88 })
      .toBuffer();
    const image = await prepareImage(new Uint8Array(drawn));
    if (!image) throw new Error(`The picture of ${animal.code} can't be read.`);
    const id = identify<PhotoId>(`photo ${animal.code}`);
    const storageKey = `photos/${workspaceId}/${id}.webp`;
    await storage.write(storageKey, image.large, 'image/webp');
    await storage.write(smallKey(storageKey), image.small, 'image/webp');
    await withScope({ workspaceId }, (tx) =>
      tx.insert(photos).values({
        workspaceId,
        id,
        animalId: animalIdOf(animal),
        storageKey,
        contentType: 'image/webp',
        width: image.width,
        height: image.height,
        sha256: createHash('sha256').update(image.large).digest('hex'),
        caption: 'Drawn for the demo',
        takenOn: dayFromNow(now, Math.max(-30, animal.hatched)),
      }),
    );
  }
}
