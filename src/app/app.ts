import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterOutlet } from '@angular/router';
import { SessionWatch } from './session/session-watch';
import { HouseCommands } from './shell/house-commands';
import { CommandPalette } from './ui/command-palette';

@Component({
  selector: 'slant-root',
  imports: [CommandPalette, HouseCommands, RouterOutlet, SessionWatch],
  template: `
    <router-outlet />
    <slant-session-watch />
    <slant-house-commands />
    <slant-command-palette />
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class App {}
