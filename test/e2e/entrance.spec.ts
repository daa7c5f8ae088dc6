import type { Page } from 'playwright-core';
import type { WatchedPage } from '../support/browser';
import { STAGE_START_MS, Stage, demoAddress, freshWord } from './support/stage';

const ownPassword = 'slow tide under the quay';
const newPassword = 'three gulls on the breakwater';

async function fillIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
}

describe('the entrance', () => {
  let stage: Stage;

  beforeAll(async () => {
    stage = await Stage.open();
  }, STAGE_START_MS);
  afterEach(() => stage.browser.closePages());
  afterAll(() => stage.close());

  async function refusedWith(email: string, password: string): Promise<string> {
    const { page, problems, expectReply } = await stage.browser.openPage();
    expectReply(401, /^\/api\/session/);
    await page.goto('/sign-in');
    await fillIn(page, email, password);
    const text = await page.getByRole('alert').innerText();
    expect(problems).toEqual([]);
    return text;
  }

  it('says the same of a wrong password and of an unknown address', async () => {
    const wrong = await refusedWith(demoAddress('range'), 'certainly not the password');
    const unknown = await refusedWith('nobody@merrow.example', 'certainly not the password');
    expect(wrong).not.toBe('');
    expect(unknown).toBe(wrong);
  }, 30_000);

  it('asks for what is missing without asking the server', async () => {
    const { page, problems, expectReply } = await stage.browser.openPage();
    expectReply(401, /^\/api\/session/);
    await page.goto('/sign-in');
    await fillIn(page, '', '');
    expect(await page.getByRole('alert').innerText()).toBe('Type the e-mail address of your account.');
    await fillIn(page, demoAddress('designer'), '');
    expect(await page.getByRole('alert').innerText()).toBe('Type the password.');
    expect(problems).toEqual([]);
  }, 30_000);

  it('fills in the address of a demo account and leads to the projects', async () => {
    const { page, problems, expectReply } = await stage.browser.openPage();
    expectReply(401, /^\/api\/session/);
    await page.goto('/sign-in');
    const accounts = page.getByRole('region', { name: 'Demo accounts' });
    await accounts.waitFor();
    expect(await accounts.getByRole('button').allInnerTexts()).toEqual(['administrator', 'designer', 'lab', 'reviewer', 'fabricator', 'range']);
    await page.getByRole('button', { name: 'designer' }).click();
    expect(await page.getByLabel('E-mail').inputValue()).toBe(demoAddress('designer'));
    // The password is next: its field has the focus.
    await page.keyboard.type(stage.password);
    await page.keyboard.press('Enter');
    await page.waitForURL('**/projects');
    await page.getByRole('heading', { name: 'Projects' }).waitFor();
    expect(problems).toEqual([]);
  }, 30_000);

  it('returns to the deep link after sign-in, and signs out', async () => {
    const { page, problems, expectReply } = await stage.browser.openPage();
    expectReply(401, /^\/api\/session/);
    await page.goto('/library?text=ring');
    await page.waitForURL('**/sign-in**');
    await fillIn(page, demoAddress('reviewer'), stage.password);
    await page.waitForURL('**/library?text=ring');
    await page.getByRole('button', { name: /^Reviewer/ }).click();
    await page.getByRole('menuitem', { name: 'Sign out' }).click();
    await page.waitForURL('**/sign-in**');
    await page.goto('/projects');
    await page.waitForURL('**/sign-in**');
    expect(problems).toEqual([]);
  }, 30_000);

  /** The administrator opens the newest letter to this address and hands its link over. */
  async function linkInLetterTo(admin: Page, email: string): Promise<string> {
    await admin.goto('/letters');
    const letter = admin.getByRole('article').filter({ hasText: `to ${email}` }).first();
    const link = await letter.getByRole('link').first().getAttribute('href');
    if (link === null) throw new Error(`the letter to ${email} holds no link`);
    return link;
  }

  async function invite(admin: WatchedPage, email: string): Promise<void> {
    await admin.page.goto('/team');
    const form = admin.page.getByRole('region', { name: 'Invitations' });
    await form.getByLabel('E-mail').fill(email);
    await form.getByLabel('designer').check();
    await form.getByRole('button', { name: 'Invite' }).click();
    await admin.page.getByRole('group', { name: 'Open invitations' }).getByRole('cell', { name: email, exact: true }).waitFor();
  }

  async function join(link: string, name: string): Promise<WatchedPage> {
    const guest = await stage.browser.openPage();
    guest.expectReply(401, /^\/api\/session/);
    await guest.page.goto(link);
    await guest.page.getByLabel('Your name').fill(name);
    await guest.page.getByLabel('Choose a password').fill('short');
    guest.expectReply(400, /^\/api\/invitations/);
    guest.expectReply(422, /^\/api\/invitations/);
    await guest.page.getByRole('button', { name: 'Join the team' }).click();
    await guest.page.getByText(/15 characters/).waitFor();
    await guest.page.getByLabel('Choose a password').fill(ownPassword);
    await guest.page.getByRole('button', { name: 'Join the team' }).click();
    await guest.page.getByRole('heading', { name: 'Projects' }).waitFor();
    return guest;
  }

  it('takes an invited person in, and gives a new password by letter', async () => {
    const email = `guest-${freshWord()}@merrow.example`;
    const admin = await stage.pageOf('admin');
    await invite(admin, email);
    const guest = await join(await linkInLetterTo(admin.page, email), 'Guest of the trial');
    await guest.page.getByRole('button', { name: 'New project' }).waitFor();
    await guest.page.getByRole('button', { name: /^Guest of the trial/ }).click();
    await guest.page.getByRole('menuitem', { name: 'Sign out' }).click();

    await guest.page.getByRole('link', { name: 'Forgotten password' }).click();
    await guest.page.getByLabel('E-mail').fill(email);
    await guest.page.getByRole('button', { name: 'Send the letter' }).click();
    await guest.page.getByRole('status').filter({ hasText: 'a letter with a link is on its way' }).waitFor();
    await guest.page.goto(await linkInLetterTo(admin.page, email));
    await guest.page.getByLabel('New password').fill(newPassword);
    await guest.page.getByRole('button', { name: 'Set the password' }).click();
    await guest.page.getByText('The password is set').waitFor();
    await guest.page.getByRole('link', { name: 'Sign in', exact: true }).click();
    await fillIn(guest.page, email, ownPassword);
    await guest.page.getByRole('alert').waitFor();
    await fillIn(guest.page, email, newPassword);
    await guest.page.getByRole('heading', { name: 'Projects' }).waitFor();
    expect([...admin.problems, ...guest.problems]).toEqual([]);
  }, 90_000);
});
