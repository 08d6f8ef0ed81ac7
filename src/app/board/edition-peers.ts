import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  computed,
  input,
  viewChild,
} from '@angular/core';
import type { PeerGroupReply } from '@contract';

/** Who is in and who is out, each with the written reason; folded on the screen, open on paper. */
@Component({
  selector: 'kv-edition-peers',
  template: `
    <details #fold>
      <summary>{{ summary() }}</summary>
      <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Peers and reasons">
        <table class="kv-table">
          <thead>
            <tr>
              <th scope="col">Company</th>
              <th scope="col">In or out</th>
              <th scope="col">Reason</th>
            </tr>
          </thead>
          <tbody>
            @for (peer of peers(); track peer.company) {
              <tr>
                <th scope="row">{{ peer.company }}</th>
                <td>{{ peer.isIncluded ? 'in' : 'out' }}</td>
                <td class="reason">{{ peer.reason || 'no reason written' }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
    </details>
  `,
  styles: `
    summary {
      min-block-size: 24px;
      cursor: pointer;
    }
    .reason {
      min-inline-size: 240px;
      overflow-wrap: anywhere;
    }
  `,
  host: {
    '(window:beforeprint)': 'unfold()',
    '(window:afterprint)': 'foldBack()',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionPeers {
  readonly peerGroup = input.required<PeerGroupReply>();

  private readonly fold = viewChild.required<ElementRef<HTMLDetailsElement>>('fold');
  #wasOpen = false;

  protected readonly peers = computed(() =>
    [...this.peerGroup().peers].sort(
      (left, right) => Number(right.isIncluded) - Number(left.isIncluded),
    ),
  );
  protected readonly summary = computed(() => {
    const { peers } = this.peerGroup();
    const inside = peers.filter(({ isIncluded }) => isIncluded).length;
    return `${inside} in, ${peers.length - inside} out: read the reasons`;
  });

  /** The page is printed as it stands, so the fold opens before that, not with the next rendering. */
  protected unfold(): void {
    const details = this.fold().nativeElement;
    this.#wasOpen = details.open;
    details.open = true;
  }

  protected foldBack(): void {
    this.fold().nativeElement.open = this.#wasOpen;
  }
}
