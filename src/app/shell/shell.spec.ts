import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { type SessionReply, problemType } from '@contract';
import { LineageStore } from '../api/lineage-store';
import { SessionStore } from '../api/session-store';
import { Shell } from './shell';

const id = (last: number): string => `0b8b8f4e-0d43-4f2c-9a43-1d3b0f5a00${10 + last}`;

function sessionOf(person: string): SessionReply {
  return {
    session: {
      person: { id: person, name: 'Mira Oduya', email: 'mira@velmara.example' },
      workspace: { id: id(9), name: 'Velmara' },
      roles: ['cfo'],
      preferences: { theme: 'system', unit: 'millions', negatives: 'minus' },
    },
  };
}

describe('the shell’s lineage drawer', () => {
  let fixture: ComponentFixture<Shell>;
  let http: HttpTestingController;
  let sessions: SessionStore;
  let lineage: LineageStore;

  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', children: [] }]),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    sessions = TestBed.inject(SessionStore);
    sessions.accept(sessionOf(id(1)));
    lineage = TestBed.inject(LineageStore);
    fixture = TestBed.createComponent(Shell);
    await fixture.whenStable();
    lineage.open({ fitId: id(2) }, 'standing');
    expect(lineage.view().kind).toBe('loading');
  });
  afterEach(() => {
    http.verify();
  });

  const call = () => http.expectOne(`/api/fits/${id(2)}/lineage/standing`);

  it('closes with the shell, and takes no reply any more', () => {
    fixture.destroy();
    expect(lineage.view()).toEqual({ kind: 'closed' });
    expect(call().cancelled).toBeTrue();
  });

  it('closes when its own question finds the session ended', () => {
    call().flush(
      { type: problemType('not-signed-in'), title: 'Sign in', status: 401 },
      { status: 401, statusText: 'Unauthorized' },
    );
    expect(sessions.session()).toBeNull();
    expect(lineage.view()).toEqual({ kind: 'closed' });
  });

  it('closes when another person signs in, and stays for the same one', () => {
    sessions.accept(sessionOf(id(1)));
    expect(lineage.view().kind).toBe('loading');
    sessions.accept(sessionOf(id(3)));
    expect(lineage.view()).toEqual({ kind: 'closed' });
    expect(call().cancelled).toBeTrue();
  });
});
