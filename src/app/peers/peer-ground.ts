import { ChangeDetectionStrategy, Component, inject, model } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { PeersStore } from './peers-store';

/** On which panel version the choice stands, whose it is, and the note that its version will carry. */
@Component({
  selector: 'kv-peer-ground',
  imports: [MatFormFieldModule, MatInput],
  template: `
    @let view = store.view();
    @if (view.kind === 'ready') {
      <form (submit)="$event.preventDefault()">
        <mat-form-field appearance="outline" subscriptSizing="dynamic">
          <mat-label>Panel version</mat-label>
          <select
            #panel
            matNativeControl
            [value]="view.draft.panelVersionId"
            (change)="store.choosePanelVersion(panel.value)"
          >
            @for (version of view.ground.panelVersions; track version.id) {
              <option [value]="version.id" [selected]="version.id === view.draft.panelVersionId">
                {{ version.panelName }} v{{ version.number }}{{ $first ? ' (newest)' : '' }}
              </option>
            }
          </select>
        </mat-form-field>
        <mat-form-field appearance="outline" subscriptSizing="dynamic">
          <mat-label>Own company</mat-label>
          <select
            #own
            matNativeControl
            [value]="view.draft.ownCompany"
            (change)="store.chooseOwnCompany(own.value)"
          >
            <option value="" disabled [selected]="view.draft.ownCompany === ''"></option>
            @for (company of view.ground.companies; track company.name) {
              <option [value]="company.name" [selected]="company.name === view.draft.ownCompany">
                {{ company.name }}
              </option>
            }
          </select>
        </mat-form-field>
        <mat-form-field class="note" appearance="outline" subscriptSizing="dynamic">
          <mat-label>Note to the version</mat-label>
          <input
            #noteBox
            matInput
            maxlength="2000"
            autocomplete="off"
            [value]="note()"
            (input)="note.set(noteBox.value)"
          />
        </mat-form-field>
      </form>
    }
  `,
  styles: `
    form {
      display: grid;
      grid-template-columns: minmax(200px, 1fr) minmax(200px, 1fr) minmax(240px, 2fr);
      gap: 16px;
      padding-block-start: 8px;
    }
    @media (width < 1024px) {
      form {
        grid-template-columns: minmax(0, 1fr) minmax(0, 1fr);
      }
      .note {
        grid-column: 1 / -1;
      }
    }
    @media (width < 720px) {
      form {
        grid-template-columns: minmax(0, 1fr);
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeerGround {
  protected readonly store = inject(PeersStore);

  readonly note = model('');
}
