import { expect, type Locator, type Page } from '@playwright/test';
import { isPhone } from './flowPeople';
import { smallPng, specimen } from './flowSpecimen';

/** What a contributor does in the form of a draft, by the labels of the form. */

export const field = (page: Page, label: string): Locator => page.getByLabel(label, { exact: true });
const choose = (page: Page, label: string, word: string) => field(page, label).selectOption({ label: word });

/** The value of a row in a list of names and values: "neurons" → "(1.87 ± 0.08) × 10⁸". */
export function valueOf(scope: Page | Locator, name: string): Locator {
  const page = 'page' in scope ? scope.page() : scope;
  return scope.locator('dl > div').filter({ has: page.getByRole('term').filter({ hasText: new RegExp(`^${name}$`) }) }).getByRole('definition');
}

/** Waits until the register has what was typed. */
export async function waitUntilKept(page: Page): Promise<void> {
  await expect(page.getByText(/^kept \d\d:\d\d$/)).toBeVisible();
}

export async function nextStep(page: Page, label: string): Promise<void> {
  await page.getByRole('button', { name: `Next: ${label.toLowerCase()}` }).click();
  await expect(page.getByRole('region', { name: label, exact: true })).toBeVisible();
}

export async function openStep(page: Page, label: string): Promise<void> {
  await page.getByRole('navigation', { name: 'Steps' }).getByRole('link', { name: new RegExp(`^${label}`) }).click();
  await expect(page.getByRole('region', { name: label, exact: true })).toBeVisible();
}

export async function beginSpecimen(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'New submission' }).click();
  await page.getByRole('button', { name: 'Enter a specimen' }).click();
  await expect(page.getByRole('region', { name: 'Specimen', exact: true })).toBeVisible();
}

export async function chooseSpecies(page: Page, name: string): Promise<void> {
  await field(page, 'Search species').fill(name.slice(0, 8));
  await page.getByRole('button', { name: `Choose ${name}` }).click();
  await expect(field(page, 'Name as entered')).toHaveValue(name);
}

export async function fillAnimal(page: Page): Promise<void> {
  await field(page, 'Specimen code').fill(specimen.code);
  await choose(page, 'Origin', 'captive');
  await choose(page, 'Sex', 'female');
  await choose(page, 'Age class', 'adult');
  await field(page, 'Body mass').fill(specimen.bodyMassG);
  await choose(page, 'Kind of body mass', 'measured');
  await field(page, 'Date of death').fill('2026-03-02');
  await field(page, 'Date of fixation').fill('2026-03-02');
}

interface Sample {
  structure: string;
  side: string;
  tissueMassG: string;
  suspensionMl: string;
  dilution: string;
  nuclei: readonly string[];
  neun: readonly (readonly [string, string])[];
}

/** A new structure with one sample: masses, suspension, aliquots, NeuN fields. */
export async function addStructure(page: Page, sample: Sample, sideWords: string): Promise<void> {
  await page.getByRole('button', { name: 'Add a structure' }).click();
  await field(page, 'Structure').selectOption(sample.structure);
  await page.getByRole('button', { name: 'Add a sample' }).click();
  await field(page, 'Tissue mass').fill(sample.tissueMassG);
  await field(page, 'Suspension volume').fill(sample.suspensionMl);
  await field(page, 'Dilution').fill(sample.dilution);
  await choose(page, 'Side counted', sideWords);
  for (const [index, nuclei] of sample.nuclei.entries()) await fillAliquot(page, index + 1, nuclei);
  for (const [index, [positive, scored]] of sample.neun.entries()) {
    if (index > 0) await page.getByRole('button', { name: 'Add NeuN field' }).click();
    await field(page, `NeuN-positive, field ${index + 1}`).fill(positive);
    await field(page, `Nuclei scored, field ${index + 1}`).fill(scored);
  }
  await field(page, 'Date of counting').fill('2026-03-20');
}

/** A form offers four rows; a further aliquot asks for its own. */
export async function fillAliquot(page: Page, number: number, nuclei: string): Promise<void> {
  if (number > 4) await page.getByRole('button', { name: 'Add aliquot' }).click();
  await field(page, `Nuclei, aliquot ${number}`).fill(nuclei);
}

export async function leaveOutAliquot(page: Page, number: number): Promise<void> {
  if (isPhone(page)) await choose(page, 'Leave an aliquot out', `aliquot ${number}`);
  await choose(page, `Aliquot ${number} left out`, 'excluded: bubble');
}

export async function fillTissue(page: Page): Promise<void> {
  await choose(page, 'Mass state', 'fixed');
  await choose(page, 'Fixation', 'perfused');
  await choose(page, 'Method of counting', 'isotropic fractionation, by eye');
}

export async function fillProvenance(page: Page): Promise<void> {
  await choose(page, 'Approval', 'exempt, with the reason');
  await field(page, 'Reason of the exemption').fill('Invented for a test: no animal was used.');
  await page.getByRole('checkbox', { name: /^I agree to the licence CC BY 4.0/ }).click();
}

export async function attachPicture(page: Page, caption: string): Promise<void> {
  const chooser = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Choose a file' }).click();
  await (await chooser).setFiles({ name: 'chamber.png', mimeType: 'image/png', buffer: smallPng });
  await field(page, 'Caption').fill(caption);
  await page.getByRole('button', { name: 'Attach the file' }).click();
  await expect(page.getByRole('img', { name: caption })).toBeVisible();
}

/** Says a sentence on everything doubtful; answers how many there were. */
export async function explainDoubtful(page: Page, sentence: string): Promise<number> {
  const words = page.getByLabel(/^Your word on /);
  const count = await words.count();
  for (let index = 0; index < count; index += 1) await words.nth(index).fill(sentence);
  return count;
}
