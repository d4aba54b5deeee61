/** Buttons that put a text, kept in the page as it should be pasted, on the clipboard. Without JavaScript they stay hidden. */
for (const button of document.querySelectorAll<HTMLButtonElement>('button[data-copy]')) {
  const line = button.parentElement;
  if (line === null || !('clipboard' in navigator)) continue;
  const said = line.querySelector('[aria-live]');
  line.hidden = false;
  button.addEventListener('click', () => {
    navigator.clipboard.writeText(button.dataset['copy'] ?? '').then(
      () => { if (said) said.textContent = 'Copied.'; },
      () => { if (said) said.textContent = 'The browser did not allow it; select the text and copy it.'; },
    );
  });
}
