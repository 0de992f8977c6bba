import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { addPerson, listPeople, type Person } from '#shared/contract/people';
import { ROLE_TITLES } from '#shared/contract/roles';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { Icon } from '../../ui/marks/icon';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** Everybody with an account, and what they may do. */
@Component({
  selector: 'qr-people-page',
  imports: [EmptyState, Icon, Loaded, MatButton, MomentPipe, PageState, RouterLink],
  templateUrl: './people-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeoplePage {
  protected readonly people = endpointResource(listPeople, () => ({}));
  protected readonly mayAdd = may(addPerson);

  protected rolesOf(person: Person): string {
    return person.roles.map((role) => ROLE_TITLES[role]).join(', ');
  }

  protected standing(person: Person): string {
    if (!person.active) return 'Deactivated';
    return person.hasPassword ? 'Active' : 'Has not set a password yet';
  }
}
