import { keepFile } from './page/keepFile.ts';

/** Pixels for each unit of a drawing, as in the pictures made at build. */
const ZOOM = 2;

/** Buttons that save a figure as PNG, drawn from its SVG file by the browser. Without JavaScript they stay hidden; the SVG is there. */
for (const button of document.querySelectorAll<HTMLButtonElement>('button[data-png]')) {
  const place = button.parentElement!;
  place.hidden = false;
  button.addEventListener('click', () => {
    const said = place.querySelector('[role="status"]')!;
    said.textContent = '';
    drawn(button.dataset['png']!).then((blob) => keepFile(button.dataset['name']!, blob), () => { said.textContent = ' (this browser could not draw it; the SVG holds the same)'; });
  });
}

async function drawn(address: string): Promise<Blob> {
  const picture = new Image();
  picture.src = address;
  await picture.decode();
  const canvas = document.createElement('canvas');
  [canvas.width, canvas.height] = [ZOOM * picture.naturalWidth, ZOOM * picture.naturalHeight];
  const context = canvas.getContext('2d');
  if (context === null) throw new Error('no canvas');
  context.drawImage(picture, 0, 0, canvas.width, canvas.height);
  return new Promise((resolve, reject) => canvas.toBlob((blob) => (blob === null ? reject(new Error('no picture')) : resolve(blob)), 'image/png'));
}
