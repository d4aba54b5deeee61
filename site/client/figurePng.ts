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
    const [address, part] = [button.dataset['png']!, button.dataset['part']!];
    drawn(address, part).then((blob) => keepFile(`${address.split('/').at(-2)}-${part}.png`, blob), () => { said.textContent = ' (this browser could not draw it; the SVG holds the same)'; });
  });
}

/** One figure of a sheet, which stands in it as a drawing of its own. */
async function drawn(address: string, part: string): Promise<Blob> {
  const sheet = new DOMParser().parseFromString(await (await fetch(address)).text(), 'image/svg+xml');
  const figure = sheet.getElementById(part);
  if (figure === null) throw new Error('no such figure');
  const [y, width, height] = ['y', 'width', 'height'].map((name) => Number(figure.getAttribute(name))) as [number, number, number];
  const picture = new Image();
  picture.src = address;
  await picture.decode();
  const canvas = document.createElement('canvas');
  [canvas.width, canvas.height] = [ZOOM * width, ZOOM * height];
  const context = canvas.getContext('2d');
  if (context === null) throw new Error('no canvas');
  context.fillStyle = '#fff';
  context.fillRect(0, 0, canvas.width, canvas.height);
  context.scale(ZOOM, ZOOM);
  context.drawImage(picture, 0, -y);
  return new Promise((resolve, reject) => canvas.toBlob((blob) => (blob === null ? reject(new Error('no picture')) : resolve(blob)), 'image/png'));
}
