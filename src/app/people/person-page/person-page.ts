import { ChangeDetectionStrategy, Component, computed, input, numberAttribute, viewChild } from '@angular/core';
import { changePerson, listPeople, type Person } from '#shared/contract/people';
import { ROLE_TITLES } from '#shared/contract/roles';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { PersonAccount } from './person-account';

/** One person: the account, for the administrator to change, for the auditor to read. */
@Component({
  selector: 'qr-person-page',
  imports: [BackLink, EmptyState, Loaded, MomentPipe, PageState, PersonAccount],
  templateUrl: './person-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonPage implements HoldsTyping {
  private readonly account = viewChild(PersonAccount);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly people = endpointResource(listPeople, () => ({}));
  protected readonly mayChange = may(changePerson);
  protected readonly person = computed(() =>
    this.people.hasValue() ? this.people.value().items.find((person) => person.id === this.id()) : undefined,
  );
  protected readonly roles = computed(() => (this.person()?.roles ?? []).map((role) => ROLE_TITLES[role]).join(', '));

  hasUnsaved(): boolean {
    return this.account()?.hasUnsaved() ?? false;
  }

  protected take(changed: Person): void {
    this.people.update(
      (people) => people && { items: people.items.map((one) => (one.id === changed.id ? changed : one)) },
    );
  }
}
