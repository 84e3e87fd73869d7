import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import type { DocumentId, PhotoId } from '@/lib/contracts/ids';
import { addDocumentUseCase } from '@/lib/use-cases/collection/add-document';
import { addPhotoUseCase } from '@/lib/use-cases/collection/add-photo';
import { editPhotoUseCase } from '@/lib/use-cases/collection/edit-photo';
import { removePhotoUseCase } from '@/lib/use-cases/collection/remove-photo';
import { showAnimalUseCase } from '@/lib/use-cases/collection/show-animal';
import { showDocumentUseCase } from '@/lib/use-cases/collection/show-document';
import { showPhotoUseCase } from '@/lib/use-cases/collection/show-photo';
import { makeWorkspace, performAs, type TestMember, type TestWorkspace } from '../setup/fixture';

let workspace: TestWorkspace;
beforeAll(async () => {
  workspace = await makeWorkspace();
});

/** A wide picture that was taken with the camera on its side, and says where. */
async function photoWithPlace(): Promise<File> {
  const bytes = await sharp({ create: { width: 2400, height: 1200, channels: 3, background: '#8a5a2b' } })
    .withExif({
      IFD0: { Copyright: 'A Person', Orientation: '6' },
      IFD3: { GPSLatitude: '51/1 30/1 0/1', GPSLatitudeRef: 'N' },
    })
    .withMetadata({ orientation: 6 })
    .jpeg()
    .toBuffer();
  return new File([new Uint8Array(bytes)], 'holiday.jpg', { type: 'image/jpeg' });
}
const addPhoto = (by: TestMember, file: File) =>
  performAs(workspace, by, addPhotoUseCase, { params: { animal: workspace.damId }, body: { file } });
const showPhoto = (by: TestMember, photo: PhotoId, size: 'large' | 'small' = 'large') =>
  performAs(workspace, by, showPhotoUseCase, { params: { photo }, query: { size } });

describe('photos', () => {
  it('are turned upright, made smaller and freed of what the camera wrote', async () => {
    const { id } = await addPhoto(workspace.owner, await photoWithPlace());
    const large = await showPhoto(workspace.owner, id);
    expect(large).toMatchObject({ contentType: 'image/webp', inline: true });
    const kept = await sharp(large.body as Uint8Array).metadata();
    expect(kept).toMatchObject({ format: 'webp', width: 800, height: 1600 });
    expect(kept.exif).toBeUndefined();
    expect(kept.xmp).toBeUndefined();
    const small = await sharp((await showPhoto(workspace.owner, id, 'small')).body as Uint8Array).metadata();
    expect([small.width, small.height]).toEqual([160, 320]);
  });

  it('are known by their content, not by their name', async () => {
    const page = new File(['<html><script>alert(1)</script></html>'], 'snake.jpg', { type: 'image/jpeg' });
    await expect(addPhoto(workspace.owner, page)).rejects.toMatchObject({ code: 'unsupported_file' });
    const drawing = new File(
      ['<svg xmlns="http://www.w3.org/2000/svg"><script>1</script></svg>'],
      'snake.png',
      { type: 'image/png' },
    );
    await expect(addPhoto(workspace.owner, drawing)).rejects.toMatchObject({ code: 'unsupported_file' });
    const cut = (await photoWithPlace()).slice(0, 300);
    await expect(addPhoto(workspace.owner, new File([cut], 'cut.jpg'))).rejects.toMatchObject({
      code: 'unsupported_file',
    });
  });

  it('are served to those who may see the animal only', async () => {
    const { id } = await addPhoto(workspace.partner, await photoWithPlace());
    expect((await showPhoto(workspace.partner, id)).contentType).toBe('image/webp');
    await expect(showPhoto(workspace.otherPartner, id)).rejects.toMatchObject({ code: 'not_found' });
    const elsewhere = await makeWorkspace();
    await expect(
      performAs(elsewhere, elsewhere.owner, showPhotoUseCase, { params: { photo: id } }),
    ).rejects.toMatchObject({ code: 'not_found' });
    await expect(addPhoto(workspace.otherPartner, await photoWithPlace())).rejects.toMatchObject({
      code: 'not_found',
    });
  });

  it('can be put first and removed', async () => {
    const last = (await addPhoto(workspace.owner, await photoWithPlace())).id;
    await performAs(workspace, workspace.owner, editPhotoUseCase, {
      params: { photo: last },
      body: { first: true, caption: 'After shed' },
    });
    const show = () =>
      performAs(workspace, workspace.owner, showAnimalUseCase, { params: { animal: workspace.damId } });
    expect((await show()).photos[0]).toMatchObject({ id: last, caption: 'After shed' });
    await performAs(workspace, workspace.owner, removePhotoUseCase, { params: { photo: last } });
    expect((await show()).photos.some(({ id }) => id === last)).toBe(false);
    await expect(showPhoto(workspace.owner, last)).rejects.toMatchObject({ code: 'not_found' });
  });
});

describe('papers', () => {
  const addPaper = (file: File) =>
    performAs(workspace, workspace.owner, addDocumentUseCase, {
      params: { animal: workspace.damId },
      body: { file },
    });
  const pdf = new File(['%PDF-1.7\n%âãÏÓ\n'], 'permit.pdf', { type: 'application/pdf' });

  it('are kept and given back as they are', async () => {
    const { id } = await addPaper(pdf);
    const file = await performAs(workspace, workspace.partner, showDocumentUseCase, {
      params: { document: id as DocumentId },
    });
    expect(file).toMatchObject({ contentType: 'application/pdf', fileName: 'permit.pdf' });
    expect(file.inline).toBeUndefined();
    expect(new TextDecoder().decode(file.body as Uint8Array)).toMatch(/^%PDF-1\.7/);
    await expect(
      performAs(workspace, workspace.otherPartner, showDocumentUseCase, { params: { document: id } }),
    ).rejects.toMatchObject({ code: 'not_found' });
  });

  it.each([
    ['a program', new File([new Uint8Array([0x7f, 0x45, 0x4c, 0x46, 2, 1, 1, 0])], 'paper.pdf')],
    ['a page with markup', new File(['<!doctype html><p>hello'], 'note.txt')],
    ['an archive', new File([new Uint8Array([0x50, 0x4b, 3, 4, 0, 0])], 'paper.png')],
  ])('refuse %s whatever it is called', async (_, file) => {
    await expect(addPaper(file)).rejects.toMatchObject({ code: 'unsupported_file' });
  });

  it('refuse more than 10 MB', async () => {
    await expect(
      addPaper(new File([new Uint8Array(10 * 1024 * 1024 + 1)], 'large.txt')),
    ).rejects.toMatchObject({ code: 'too_large' });
  });
});
