import { expect, test } from '@playwright/test';
import { addStructure, attachPicture, beginSpecimen, chooseSpecies, explainDoubtful, field, fillAliquot, fillAnimal, fillProvenance, fillTissue, leaveOutAliquot, nextStep, openStep, valueOf, waitUntilKept } from './support/flowDraft';
import { openPlace, people, signInAs, type PersonKey } from './support/flowPeople';
import { commentAt, decide, followNotice, openFromQueue, openPoints, openRow } from './support/flowReview';
import { estimate, printedCount, specimen } from './support/flowSpecimen';

/**
 * From sign-in to the citation of version 2, every act through the screen. Each test is the turn of one
 * person and begins where the one before ended.
 */
test.describe.configure({ mode: 'serial', timeout: 240_000 });

const { cortex, cerebellum } = specimen;
const aside = { species: 'Commenticervus planus', reason: 'White matter was left on one side only.' };
const title = `${specimen.species}, ${specimen.code}`;
const cortexSum = estimate({ ...cortex, nuclei: cortex.nuclei.slice(0, cortex.spoilt - 1) }, 2);

test('a contributor enters a specimen, loses nothing on reload, explains what is doubtful and submits', async ({ page }) => {
  await signInAs(page, 'contributor');
  await openPlace(page, 'Submissions');
  await beginSpecimen(page);
  await chooseSpecies(page, specimen.species);
  await fillAnimal(page);
  // At once, before the pause after which the register is told.
  await page.reload();
  await expect(field(page, 'Specimen code')).toHaveValue(specimen.code);
  await expect(field(page, 'Date of fixation')).toHaveValue('2026-03-02');
  await waitUntilKept(page);

  await nextStep(page, 'Structures');
  await addStructure(page, cortex, 'right side');
  await leaveOutAliquot(page, cortex.spoilt);
  await page.getByRole('button', { name: 'One side counted: double it' }).click();
  const shown = await valueOf(page, 'neurons').innerText();
  expect(Math.abs(printedCount(shown) / cortexSum.neurons - 1)).toBeLessThan(0.02);
  expect(Math.abs(printedCount(await valueOf(page, 'cells').innerText()) / cortexSum.cells - 1)).toBeLessThan(0.02);
  await expect(valueOf(page, 'mass')).toContainText('4.16 g');
  await expect(page.getByRole('heading', { name: 'Place on the line of Primates' })).toBeVisible();

  await addStructure(page, cerebellum, 'both sides');
  await waitUntilKept(page);
  await page.reload();
  await page.getByRole('tab', { name: cortex.words }).click();
  await expect(field(page, 'Nuclei, aliquot 5')).toHaveValue('151');
  await expect(field(page, 'NeuN-positive, field 4')).toHaveValue('78');
  await page.getByRole('tab', { name: cerebellum.words }).click();
  await expect(field(page, 'Nuclei, aliquot 3')).toHaveValue('291');

  await nextStep(page, 'Tissue and method');
  await fillTissue(page);
  await nextStep(page, 'Provenance');
  await fillProvenance(page);
  await nextStep(page, 'Evidence');
  await attachPicture(page, 'chamber, aliquot 2');
  await nextStep(page, 'Check and submit');
  await expect(page.getByRole('heading', { name: 'Nothing is missing or impossible' })).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Place on the line of Primates' })).toBeVisible();
  await expect(page.getByRole('group', { name: /^few aliquots at cerebellum/ })).toBeVisible();
  await page.getByRole('button', { name: 'Submit for review' }).click();
  await expect(page.getByRole('alert')).toContainText('Not submitted yet');
  expect(await explainDoubtful(page, 'The suspension was used up after three loads.')).toBeGreaterThan(0);
  await page.getByRole('button', { name: 'Submit for review' }).click();
  await expect(page.getByText('It waits for a reviewer of another laboratory.')).toBeVisible();
  await expect(page.getByText(`Revision 1 of ${title} is submitted.`)).toBeVisible();
});

test('a reviewer of another laboratory comments at a field and asks for changes with checklist and reason', async ({ page }) => {
  await signInAs(page, 'reviewer');
  await openPlace(page, 'Review');
  await openFromQueue(page, title, 1);
  await expect(page.getByRole('table', { name: `Aliquots of sample 1 of ${cortex.words}` })).toContainText('excluded: bubble');
  await expect(page.getByText('The contributor says: “The suspension was used up after three loads.”').first()).toBeVisible();
  await expect(page.getByRole('img', { name: 'chamber, aliquot 2' })).toBeVisible();
  await expect(page.getByText('the line is fitted without this species')).toBeVisible();
  await commentAt(page, `Comment on sample 1 of ${cerebellum.words}`, 'Was a fourth load counted?');
  await decide(page, 'Ask for changes', 'Ask for changes in revision 1', 'Add the fourth load of the cerebellum, or say why there is none.');
  await expect(page.getByText(`Revision 1 of ${title} is sent back.`)).toBeVisible();
});

test('the contributor reads what is asked, answers the comment and submits revision 2', async ({ page }) => {
  await signInAs(page, 'contributor');
  await followNotice(page, 'Changes requested');
  await expect(page.getByText('The reviewer asks for changes. Write the next revision: it begins with these values.')).toBeVisible();
  await expect(page.getByText('Add the fourth load of the cerebellum, or say why there is none.').first()).toBeVisible();
  await page.getByRole('button', { name: 'Write revision 2' }).click();
  await expect(page.getByText('Rafael Lindqvist asks for changes in revision 1')).toBeVisible();
  await page.getByRole('button', { name: /^Comments at fields, 1/ }).click();
  const answer = page.getByLabel(`Answer at ${cerebellum.words}, sample 1`);
  await answer.fill('It was; it is entered now.');
  await page.getByRole('button', { name: 'Send', exact: true }).click();
  await expect(answer).toHaveValue('');
  await expect(page.getByRole('group', { name: `Thread at ${cerebellum.words}, sample 1` })).toContainText('It was; it is entered now.');
  await openStep(page, 'Structures');
  await page.getByRole('tab', { name: cerebellum.words }).click();
  await fillAliquot(page, 4, cerebellum.fourth);
  await waitUntilKept(page);
  await openStep(page, 'Check and submit');
  await expect(page.getByRole('group', { name: /^few aliquots at cerebellum/ })).toBeHidden();
  await explainDoubtful(page, 'Looked at again; it is as counted.');
  await page.getByRole('button', { name: 'Submit for review' }).click();
  await expect(page.getByText(`Revision 2 of ${title} is submitted.`)).toBeVisible();
});

test('the reviewer sees what changed and approves', async ({ page }) => {
  await signInAs(page, 'reviewer');
  await openPlace(page, 'Review');
  await openFromQueue(page, title, 2);
  const thread = page.getByRole('group', { name: `Thread at ${cerebellum.words}, sample 1` });
  await expect(thread).toContainText('It was; it is entered now.');
  await expect(thread).toContainText(`empty → ${cerebellum.fourth}`);
  await decide(page, 'Approve', 'Approve revision 2', 'Counts, evidence and place on the line agree.');
  await expect(page.getByText(`Revision 2 of ${title} is approved.`)).toBeVisible();
});

test('the curator finds the record waiting and asks for a re-check of it', async ({ page }) => {
  await signInAs(page, 'curator');
  await openPlace(page, 'Curate');
  await openRow(page, 'Approved records in no version yet', specimen.species, cortex.words);
  await expect(page.getByText('approved, in no version yet')).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Place on the line' })).toBeVisible();
  await page.getByRole('button', { name: 'Ask for a re-check' }).click();
  const sheet = page.getByRole('dialog');
  await sheet.getByLabel('What is to be checked').fill('Was the white matter weighed with the cortex?');
  await sheet.getByRole('button', { name: 'Ask for the re-check' }).click();
  await expect(page.getByText(/^A re-check of AK-\d{6} is open\.$/)).toBeVisible();
});

test('the contributor confirms the count with evidence', async ({ page }) => {
  await signInAs(page, 'contributor');
  await followNotice(page, 'Re-check asked');
  await expect(page.getByText('Was the white matter weighed with the cortex?').first()).toBeVisible();
  await page.getByRole('radio', { name: /^Confirmed with evidence/ }).click();
  await page.getByLabel('Your answer').fill('It was: both were in the dish that was weighed.');
  await page.getByLabel('Evidence', { exact: true }).selectOption({ label: 'chamber, aliquot 2' });
  await page.getByRole('button', { name: 'Send the answer' }).click();
  await expect(page.getByText('answered: confirmed with evidence')).toBeVisible();
});

test('the reviewer closes the re-check', async ({ page }) => {
  await signInAs(page, 'reviewer');
  await followNotice(page, 'Re-check answered');
  await page.getByLabel('Reason', { exact: true }).fill('The evidence answers it.');
  await page.getByRole('button', { name: 'Close the re-check' }).click();
  await expect(page.getByText(/^The re-check of AK-\d{6} is closed\.$/)).toBeVisible();
  await page.getByRole('link', { name: /^AK-\d{6}$/ }).click();
  await expect(page.getByText('re-check closed').first()).toBeVisible();
  await expect(page.getByRole('listitem').filter({ hasText: 'The evidence answers it.' })).toBeVisible();
});

test('the curator sets a record aside from one pair of variables, with the reason', async ({ page }) => {
  await signInAs(page, 'curator');
  await openPlace(page, 'Curate');
  await openRow(page, 'Approved records in no version yet', aside.species, cortex.words);
  await page.getByRole('button', { name: 'Set aside' }).click();
  const sheet = page.getByRole('dialog');
  await sheet.getByRole('radio', { name: 'mass and neurons of the cerebral cortex, either one on x' }).click();
  await sheet.getByLabel('Reason, for everyone to read').fill(aside.reason);
  await sheet.getByRole('button', { name: 'Set aside' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Set aside' }).last().click();
  await expect(page.getByText(/^AK-\d{6} is set aside\.$/)).toBeVisible();
});

test('the curator looks at the next version and freezes it', async ({ page }) => {
  await signInAs(page, 'curator');
  await openPlace(page, 'Curate');
  await page.getByRole('link', { name: 'Look at the next version' }).click();
  await expect(page.getByText('It holds demonstration records: its title, its page and every file will say so.')).toBeVisible();
  await expect(page.getByRole('table', { name: 'Exponents of version 2' })).toBeVisible();
  await page.getByRole('button', { name: /^\d+ records came/ }).click();
  await expect(page.getByText(`${specimen.species}, ${cortex.words}`)).toBeVisible();
  await page.getByLabel('Note for the version\'s page').fill('Frozen with the first demonstration records.');
  await page.getByLabel('Number of the version').fill('3');
  await expect(page.getByText('The version you looked at is 2.')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Freeze version 2' })).toBeDisabled();
  await page.getByLabel('Number of the version').fill('2');
  await page.getByRole('button', { name: 'Freeze version 2' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Freeze it' }).click();
  await expect(page.getByRole('heading', { name: 'Version 2 is frozen' })).toBeVisible({ timeout: 60_000 });
  await page.getByRole('link', { name: 'Open version 2' }).click();
  await expect(page.getByText('Frozen with the first demonstration records.')).toBeVisible();
});

test('anyone opens version 2, verifies it, finds the species on the line, reads its trail and cites it', async ({ page }) => {
  await page.goto('/');
  await openPlace(page, 'Versions');
  await openRow(page, 'Versions', 'Version 2');
  await expect(page.getByRole('group', { name: /^Version 2, frozen \d{4}-\d\d-\d\d/ })).toBeVisible();
  await expect(page.getByText('This version holds demonstration data: invented animals and counts.')).toBeVisible();
  await expect(page.getByRole('table', { name: 'Files of version 2' }).getByRole('link', { name: 'records.csv' })).toBeVisible();
  await expect(page.getByText(aside.reason).first()).toBeVisible();
  await page.getByRole('button', { name: 'Verify here' }).click();
  await expect(page.getByText(/^all \d+ files were read again: size and SHA-256 agree$/)).toBeVisible();
  await expect(page.getByText(/version 2\. DOI not minted\. Frozen/)).toBeVisible();
  await page.getByRole('radio', { name: 'BibTeX' }).click();
  await expect(page.getByText(/version\s*= \{2\}/)).toBeVisible();

  await openRow(page, 'Exponents of version 2', 'Primates');
  await openPoints(page);
  const point = page.getByRole('table', { name: 'Points of the figure' }).getByRole('row').filter({ hasText: specimen.species });
  await expect(point).toBeVisible();
  await point.getByRole('link', { name: /^AK-/ }).click();
  await expect(page.getByText('in version 2', { exact: true })).toBeVisible();
  const shown = printedCount(await valueOf(page, 'neurons').innerText());
  expect(Math.abs(shown / cortexSum.neurons - 1)).toBeLessThan(0.02);
  for (const happening of ['revision 2 submitted', 'revision 2 approved', 'frozen in version 2']) await expect(page.getByRole('listitem').filter({ hasText: happening })).toBeVisible();
  await page.getByRole('button', { name: /^Cite record AK-/ }).click();
  await expect(page.getByRole('dialog').getByText(/version 2\. DOI not minted/)).toBeVisible();
});

test('the administrator finds in the outbox each mail of the flow once to each person', async ({ page }) => {
  await signInAs(page, 'administrator');
  await openPlace(page, 'People');
  await page.getByRole('link', { name: 'Outbox' }).click();
  const sent = (subject: string, to: PersonKey) => page.getByRole('button', { name: new RegExp(`^Allokarya: ${subject}.* to ${people[to].email}`) });
  const inFlow = `.*${specimen.species}`;
  await expect(sent(`To review: ${title}`, 'reviewer')).toHaveCount(1);
  await expect(sent(`Changes requested: ${title}`, 'contributor')).toHaveCount(1);
  await expect(sent(`Changes made: ${title}`, 'reviewer')).toHaveCount(1);
  await expect(sent(`Approved: ${title}`, 'contributor')).toHaveCount(1);
  await expect(sent(`Re-check asked${inFlow}`, 'contributor')).toHaveCount(1);
  await expect(sent(`Re-check answered${inFlow}`, 'reviewer')).toHaveCount(1);
  await expect(sent(`Re-check closed${inFlow}`, 'contributor')).toHaveCount(1);
  await expect(sent('version 2 is frozen', 'contributor')).toHaveCount(1);
  await expect(sent('version 2 is frozen', 'curator')).toHaveCount(1);
});
