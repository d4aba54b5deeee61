import { holdsForm } from './typedForm.ts';

/** Shows the part of the compare page that the address asks for: picked measurements, or bands to be typed. Each part's script is fetched only then. */
async function startCompare(): Promise<void> {
  const { searchParams } = new URL(location.href);
  const typing = searchParams.has('new') || searchParams.has('otherwise') || holdsForm(searchParams);
  const part = document.getElementById(typing ? 'typed' : 'picked');
  for (const link of document.querySelectorAll<HTMLElement>('[data-part]')) {
    if (link.dataset['part'] === (typing ? 'typed' : 'picked')) link.setAttribute('aria-current', 'true');
  }
  if (part === null) return;
  part.hidden = false;
  try {
    if (typing) await (await import('./startTyped.ts')).startTyped(part);
    else await (await import('./startPicked.ts')).startPicked(part);
  } catch (error) {
    const status = part.querySelector('[role=status]');
    if (status) status.textContent = `The data of this page could not be loaded (${error instanceof Error ? error.message : 'unknown reason'}). Reload the page to try again.`;
  }
}

void startCompare();
