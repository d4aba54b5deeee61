import { url } from '../../url.ts';

/** A search box on a page without a table: it goes to the collection with what was typed. */
const form = document.querySelector<HTMLFormElement>('#look');
form?.addEventListener('submit', (event) => {
  // The content security policy lets no form be sent; the address says it all.
  event.preventDefault();
  location.href = `${url('')}?q=${encodeURIComponent(form.querySelector('input')!.value)}`;
});
if (form) form.hidden = false;
