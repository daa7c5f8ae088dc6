import type { Page } from 'playwright-core';
import type { WatchedPage } from '../support/browser';
import { eventually } from './support/eventually';
import { STAGE_START_MS, Stage, demoAddress, freshWord } from './support/stage';

const ownPassword = 'slow tide under the quay';
const newPassword = 'three gulls on the breakwater';

async function fillIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
}

const alertSays = (page: Page, text: string): Promise<void> => eventually(async () => expect(await page.getByRole('alert').innerText()).toBe(text));

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
    const alert = page.getByRole('alert').filter({ hasText: /\S/ });
    await alert.waitFor();
    expect(problems).toEqual([]);
    return alert.innerText();
  }

  it('says the same of a wrong password and of an unknown address', async () => {
    const wrong = await refusedWith(demoAddress('range'), 'certainly not the password');
    const unknown = await refusedWith('nobody@merrow.example', 'certainly not the password');
    expect(wrong).not.toBe('');
    expect(unknown).toBe(wrong);
  });

  it('asks for what is missing without asking the server', async () => {
    const { page, problems, expectReply } = await stage.browser.openPage();
    expectReply(401, /^\/api\/session/);
    await page.goto('/sign-in');
    await fillIn(page, '', '');
    await alertSays(page, 'Type the e-mail address of your account.');
    await fillIn(page, demoAddress('designer'), '');
    await alertSays(page, 'Type the password.');
    expect(problems).toEqual([]);
  });

  it('fills in the address of a demo account and leads to the projects', async () => {
    const { page, problems, expectReply } = await stage.browser.openPage();
    expectReply(401, /^\/api\/session/);
    await page.goto('/sign-in');
    const accounts = page.getByRole('region', { name: 'Demo accounts' });
    await accounts.waitFor();
    await eventually(async () =>
      expect(await accounts.getByRole('button').allInnerTexts()).toEqual(['administrator', 'designer', 'lab', 'reviewer', 'fabricator', 'range']),
    );
    await page.getByRole('button', { name: 'designer' }).click();
    await eventually(async () => expect(await page.getByLabel('E-mail').inputValue()).toBe(demoAddress('designer')));
    // The password is next: its field has the focus.
    await page.getByLabel('Password', { exact: true }).and(page.locator(':focus')).waitFor();
    await page.keyboard.type(stage.password);
    await page.keyboard.press('Enter');
    await page.waitForURL('**/projects');
    await page.getByRole('heading', { name: 'Projects' }).waitFor();
    expect(problems).toEqual([]);
  });

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
  });

  /** The administrator waits for the letter to this address and hands its link over. Letters leave a moment after their cause. */
  async function linkInLetterTo(admin: Page, email: string, path: string): Promise<string> {
    await admin.goto('/letters');
    const link = admin.getByRole('article').filter({ hasText: `to ${email}` }).locator(`a[href*="${path}"]`);
    await eventually(async () => {
      await admin.getByRole('button', { name: 'Read again' }).click();
      expect(await link.count()).toBe(1);
    });
    return (await link.getAttribute('href')) ?? '';
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
    await guest.page.getByRole('alert').filter({ hasText: /15 characters/ }).waitFor();
    await guest.page.getByLabel('Choose a password').fill(ownPassword);
    await guest.page.getByRole('button', { name: 'Join the team' }).click();
    await guest.page.getByRole('heading', { name: 'Projects' }).waitFor();
    return guest;
  }

  it('takes an invited person in, and gives a new password by letter', async () => {
    const email = `guest-${freshWord()}@merrow.example`;
    const admin = await stage.pageOf('admin');
    await invite(admin, email);
    const guest = await join(await linkInLetterTo(admin.page, email, '/invitation'), 'Guest of the trial');
    await guest.page.getByRole('button', { name: 'New project' }).waitFor();
    await guest.page.getByRole('button', { name: /^Guest of the trial/ }).click();
    await guest.page.getByRole('menuitem', { name: 'Sign out' }).click();

    await guest.page.getByRole('link', { name: 'Forgotten password' }).click();
    await guest.page.getByRole('heading', { name: 'Forgotten password' }).waitFor(); // the page before it has a field E-mail too
    await guest.page.getByLabel('E-mail').fill(email);
    await guest.page.getByRole('button', { name: 'Send the letter' }).click();
    await guest.page.getByRole('status').filter({ hasText: 'a letter with a link has been written' }).waitFor();
    await guest.page.goto(await linkInLetterTo(admin.page, email, '/new-password'));
    await guest.page.getByLabel('New password').fill(newPassword);
    await guest.page.getByRole('button', { name: 'Set the password' }).click();
    await guest.page.getByText('The password is set').waitFor();
    await guest.page.getByRole('link', { name: 'Sign in', exact: true }).click();
    await fillIn(guest.page, email, ownPassword);
    await guest.page.getByRole('alert').waitFor();
    await fillIn(guest.page, email, newPassword);
    await guest.page.getByRole('heading', { name: 'Projects' }).waitFor();
    expect([...admin.problems, ...guest.problems]).toEqual([]);
  });
});
