import 'server-only';
import { mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { configuration } from './configuration';

/** Keeps files by key; keys are made by the product and hold no names of people. */
export interface FileStorage {
  write(key: string, content: Uint8Array, contentType: string): Promise<void>;
  /** @returns null when there is no such file */
  read(key: string): Promise<Uint8Array<ArrayBuffer> | null>;
  remove(key: string): Promise<void>;
}

const safeKey = /^[a-z0-9][a-z0-9/._-]{0,200}$/;

function folderStorage(folder: string): FileStorage {
  const place = (key: string) => {
    if (!safeKey.test(key) || key.includes('..')) throw new Error(`Not a storage key: ${key}`);
    return path.join(/* turbopackIgnore: true */ folder, key);
  };
  return {
    async write(key, content) {
      await mkdir(path.dirname(place(key)), { recursive: true });
      await writeFile(place(key), content);
    },
    async read(key) {
      try {
        return new Uint8Array(await readFile(place(key)));
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
        throw error;
      }
    },
    async remove(key) {
      await rm(place(key), { force: true });
    },
  };
}

/** The storage that the configuration names. */
export function openStorage(): FileStorage {
  const { storage } = configuration();
  if (storage.kind === 'folder')
    return folderStorage(path.resolve(/* turbopackIgnore: true */ process.cwd(), storage.folder));
  throw new Error('S3 storage is not connected yet.');
}
