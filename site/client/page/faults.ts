/** What is wrong with one field of a form, in words that stand beside it. */
export interface FieldFault {
  /** Name of the field, "ion" or "bands.0.position". */
  readonly field: string;
  readonly text: string;
}

/** Shows each fault beside its field and takes away those that are mended. Fields are found by `data-field`. */
export function showFaults(form: HTMLElement, faults: readonly FieldFault[]): void {
  const byField = new Map(faults.map((fault) => [fault.field, fault.text]));
  for (const input of form.querySelectorAll<HTMLElement>('[data-field]')) {
    const text = byField.get(input.dataset['field']!) ?? null;
    const id = `${input.id}-fault`;
    const shown = document.getElementById(id);
    if (text === null) {
      shown?.remove();
      input.removeAttribute('aria-invalid');
      setDescription(input, id, false);
    } else {
      const line = shown ?? document.createElement('p');
      line.id = id;
      line.className = 'fault';
      if (line.textContent !== text) line.textContent = text;
      if (shown === null) input.insertAdjacentElement('afterend', line);
      input.setAttribute('aria-invalid', 'true');
      setDescription(input, id, true);
    }
  }
}

/** Adds or takes away an id among those that describe a field. */
function setDescription(input: HTMLElement, id: string, on: boolean): void {
  const ids = (input.getAttribute('aria-describedby') ?? '').split(' ').filter((one) => one !== '' && one !== id);
  if (on) ids.push(id);
  if (ids.length === 0) input.removeAttribute('aria-describedby');
  else input.setAttribute('aria-describedby', ids.join(' '));
}
