import { Injectable, inject } from '@angular/core';
import {
  type ChangeScenario,
  type CopyScenario,
  DraftReply,
  type SaveDraft,
  type SaveScenario,
  ScenarioCopyReply,
  ScenarioReply,
  ScenarioVersionsReply,
  ScenariosReply,
  apiRoutes,
} from '@contract';
import type { Observable } from 'rxjs';
import type * as z from 'zod';
import { ApiClient } from './api-client';

/** Saved scenarios of a fit, and one's own unsaved plans. */
@Injectable({ providedIn: 'root' })
export class ScenariosApi {
  readonly #client = inject(ApiClient);

  list(fitId: string): Observable<ScenariosReply> {
    return this.#client.call(apiRoutes.listScenarios, ScenariosReply, { path: { fitId } });
  }

  read(scenarioId: string): Observable<ScenarioReply> {
    return this.#client.call(apiRoutes.readScenario, ScenarioReply, { path: { scenarioId } });
  }

  save(body: z.input<typeof SaveScenario>): Observable<ScenarioReply> {
    return this.#client.call(apiRoutes.saveScenario, ScenarioReply, { body });
  }

  change(scenarioId: string, body: z.input<typeof ChangeScenario>): Observable<ScenarioReply> {
    return this.#client.call(apiRoutes.changeScenario, ScenarioReply, {
      path: { scenarioId },
      body,
    });
  }

  delete(scenarioId: string): Observable<void> {
    return this.#client.send(apiRoutes.deleteScenario, { path: { scenarioId } });
  }

  restore(scenarioId: string): Observable<ScenarioReply> {
    return this.#client.call(apiRoutes.restoreScenario, ScenarioReply, { path: { scenarioId } });
  }

  /** Every stored version, newest first. */
  versions(scenarioId: string): Observable<ScenarioVersionsReply> {
    return this.#client.call(apiRoutes.listScenarioVersions, ScenarioVersionsReply, {
      path: { scenarioId },
    });
  }

  /** A copy onto the same fit, or onto the one that the body names. */
  copy(scenarioId: string, body: CopyScenario = {}): Observable<ScenarioCopyReply> {
    return this.#client.call(apiRoutes.copyScenario, ScenarioCopyReply, {
      path: { scenarioId },
      body,
    });
  }

  readDraft(fitId: string, scenarioId: string | null): Observable<DraftReply> {
    return this.#client.call(apiRoutes.readDraft, DraftReply, {
      path: { fitId },
      query: draftQuery(scenarioId),
    });
  }

  saveDraft(fitId: string, body: z.input<typeof SaveDraft>): Observable<DraftReply> {
    return this.#client.call(apiRoutes.saveDraft, DraftReply, { path: { fitId }, body });
  }

  discardDraft(fitId: string, scenarioId: string | null): Observable<void> {
    return this.#client.send(apiRoutes.discardDraft, {
      path: { fitId },
      query: draftQuery(scenarioId),
    });
  }
}

function draftQuery(scenarioId: string | null): Record<string, string> {
  return scenarioId === null ? {} : { scenario: scenarioId };
}
