import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { Observable } from 'rxjs';
import {
  about,
  currentSession,
  letterList,
  sessionList,
  tokenCreated,
  tokenList,
} from '../../../shared/contracts/session';
import type { About, CurrentSession, Letter, OwnSession, PersonalToken, TokenCreated } from '../../../shared/contracts/session';
import { invitationWelcome } from '../../../shared/contracts/team';
import type { InvitationWelcome } from '../../../shared/contracts/team';
import type { Scope } from '../../../shared/contracts/common';

interface Parser<T> {
  parse(value: unknown): T;
}

/** Sign-in, the own account, its sessions and tokens. Rejects with HttpErrorResponse: see `failed-call.ts`. */
@Injectable({ providedIn: 'root' })
export class SessionClient {
  private readonly http = inject(HttpClient);

  about = (): Promise<About> => this.answer(about, this.http.get('/api/about'));
  current = (): Promise<CurrentSession> => this.answer(currentSession, this.http.get('/api/session'));
  refresh = (): Promise<CurrentSession> => this.answer(currentSession, this.http.post('/api/session/refresh', null));

  signIn = (email: string, password: string): Promise<CurrentSession> =>
    this.answer(currentSession, this.http.post('/api/session', { email, password }));

  signOut = (): Promise<unknown> => firstValueFrom(this.http.delete('/api/session'));

  chooseTeam = (teamId: string): Promise<CurrentSession> => this.answer(currentSession, this.http.put('/api/session/team', { teamId }));

  rename = (name: string): Promise<CurrentSession> => this.answer(currentSession, this.http.put('/api/account', { name }));

  changePassword = (change: { currentPassword: string; newPassword: string; endOtherSessions: boolean }): Promise<unknown> =>
    firstValueFrom(this.http.put('/api/account/password', change));

  requestReset = (email: string): Promise<unknown> => firstValueFrom(this.http.post('/api/password-resets', { email }));

  completeReset = (token: string, newPassword: string): Promise<unknown> =>
    firstValueFrom(this.http.post('/api/password-resets/completion', { token, newPassword }));

  lookUpInvitation = (token: string): Promise<InvitationWelcome> =>
    this.answer(invitationWelcome, this.http.post('/api/invitations/lookup', { token }));

  acceptInvitation = (acceptance: { token: string; name?: string; password: string }): Promise<CurrentSession> =>
    this.answer(currentSession, this.http.post('/api/invitations/acceptance', acceptance));

  async sessions(): Promise<readonly OwnSession[]> {
    return (await this.answer(sessionList, this.http.get('/api/sessions'))).items;
  }

  endSession = (id: string): Promise<unknown> => firstValueFrom(this.http.delete(`/api/sessions/${encodeURIComponent(id)}`));
  endOtherSessions = (): Promise<unknown> => firstValueFrom(this.http.delete('/api/sessions'));

  async tokens(): Promise<readonly PersonalToken[]> {
    return (await this.answer(tokenList, this.http.get('/api/tokens'))).items;
  }

  createToken = (token: { name: string; scopes: readonly Scope[]; days: number }): Promise<TokenCreated> =>
    this.answer(tokenCreated, this.http.post('/api/tokens', token));

  revokeToken = (id: string): Promise<unknown> => firstValueFrom(this.http.delete(`/api/tokens/${encodeURIComponent(id)}`));

  async letters(): Promise<readonly Letter[]> {
    return (await this.answer(letterList, this.http.get('/api/development/letters'))).items;
  }

  private async answer<T>(schema: Parser<T>, call: Observable<unknown>): Promise<T> {
    return schema.parse(await firstValueFrom(call));
  }
}
