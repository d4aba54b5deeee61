import { BAND_FIELDS, type BandFields, type LigandFields, PLAIN_FIELDS, type TypedForm, emptyBand } from './typedForm.ts';

const LIGAND_FIELDS = ['ligand', 'count', 'bound'] as const satisfies readonly (keyof LigandFields)[];

type Field = HTMLInputElement | HTMLSelectElement;

/** The form on the page: read and filled as one value. Rows of ligands and bands are cloned from templates. */
export interface FormFields {
  readonly typed: () => TypedForm;
  readonly fill: (form: TypedForm) => void;
  readonly addRow: (kind: 'ligands' | 'bands') => void;
  readonly removeRow: (row: Element) => void;
}

export function formFields(form: HTMLFormElement): FormFields {
  const list = (kind: 'ligands' | 'bands'): HTMLElement => form.querySelector<HTMLElement>(`[data-rows=${kind}]`)!;
  const rows = (kind: 'ligands' | 'bands'): readonly HTMLElement[] => [...list(kind).querySelectorAll<HTMLElement>('[data-row]')];
  const plainField = (name: string): Field => form.elements.namedItem(name) as Field;
  const inRow = (row: Element, name: string): Field => row.querySelector<Field>(`[data-name=${name}]`)!;

  const renumber = (kind: 'ligands' | 'bands'): void => {
    rows(kind).forEach((row, place) => {
      for (const input of row.querySelectorAll<HTMLElement>('[data-name]')) {
        const name = input.dataset['name']!;
        input.id = `${kind}-${place}-${name}`;
        input.dataset['field'] = `${kind}.${place}.${name}`;
        input.setAttribute('aria-label', `${kind === 'bands' ? 'Band' : 'Ligand'} ${place + 1}: ${input.dataset['label']}`);
        // A fault belongs to the row's old number; it is shown anew.
        input.removeAttribute('aria-invalid');
        input.removeAttribute('aria-describedby');
      }
      for (const fault of row.querySelectorAll('.fault')) fault.remove();
      row.querySelector('[data-remove-row]')?.setAttribute('aria-label', `Take away ${kind === 'bands' ? 'band' : 'ligand'} ${place + 1}`);
    });
  };

  const add = (kind: 'ligands' | 'bands'): HTMLElement => {
    const template = document.getElementById(`${kind}-row`) as HTMLTemplateElement;
    list(kind).append(template.content.cloneNode(true));
    return rows(kind).at(-1)!;
  };

  const fillRow = (row: Element, names: readonly string[], values: Readonly<Record<string, string>>): void => {
    for (const name of names) inRow(row, name).value = values[name] ?? '';
  };

  return {
    typed: () => ({
      ...Object.fromEntries(PLAIN_FIELDS.map((name) => [name, plainField(name).value])),
      ligands: rows('ligands').map((row) => Object.fromEntries(LIGAND_FIELDS.map((name) => [name, inRow(row, name).value])) as unknown as LigandFields),
      bands: rows('bands').map((row) => Object.fromEntries(BAND_FIELDS.map((name) => [name, inRow(row, name).value])) as unknown as BandFields),
    }) as unknown as TypedForm,
    fill: (typed) => {
      for (const name of PLAIN_FIELDS) plainField(name).value = typed[name];
      for (const kind of ['ligands', 'bands'] as const) list(kind).replaceChildren();
      for (const ligand of typed.ligands) fillRow(add('ligands'), LIGAND_FIELDS, { ...ligand });
      for (const band of typed.bands) fillRow(add('bands'), BAND_FIELDS, { ...band });
      renumber('ligands');
      renumber('bands');
    },
    addRow: (kind) => {
      const row = add(kind);
      if (kind === 'bands') fillRow(row, BAND_FIELDS, { ...emptyBand });
      renumber(kind);
      row.querySelector<HTMLElement>('[data-name]')?.focus();
    },
    removeRow: (row) => {
      const kind = row.closest<HTMLElement>('[data-rows]')!.dataset['rows'] as 'ligands' | 'bands';
      row.remove();
      renumber(kind);
    },
  };
}
