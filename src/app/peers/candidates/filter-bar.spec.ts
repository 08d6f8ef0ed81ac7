import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatSelectHarness } from '@angular/material/select/testing';
import { Router } from '@angular/router';
import { NumberFormat } from '../../ui/number-format';
import { loadedPeers } from '../testing/loaded-peers';
import { panelCompany } from '../testing/panel-company';
import { FilterBar } from './filter-bar';

const companies = ['Kesdrin', 'Sarvane', 'Tolvane', 'Velmara'].map((name, place) =>
  panelCompany(name, {
    marketValue: 1000 * (place + 1),
    rows: 4 + place,
    attributes: { Industry: place === 1 ? 'Valves' : 'Pumps' },
  }),
);

describe('the filter bar', () => {
  async function shown() {
    const { candidates } = await loadedPeers(companies, 'Velmara', [
      'Kesdrin',
      'Sarvane',
      'Tolvane',
    ]);
    TestBed.inject(NumberFormat).unit.set('billions');
    const fixture = TestBed.createComponent(FilterBar);
    const loader = TestbedHarnessEnvironment.loader(fixture);
    const fields = await loader.getAllHarnesses(MatInputHarness);
    return {
      fields,
      select: await loader.getHarness(MatSelectHarness),
      page: fixture.nativeElement as HTMLElement,
      names: () => candidates.candidates().map(({ name }) => name),
      address: async () => {
        await fixture.whenStable();
        return TestBed.inject(Router).url;
      },
    };
  }

  async function enter(field: MatInputHarness, text: string): Promise<void> {
    await field.setValue(text);
    await (await field.host()).dispatchEvent('change');
  }

  it('offers each value of an attribute with its count, several at once', async () => {
    const { select, names, address, page } = await shown();
    await select.open();
    const options = await select.getOptions();
    expect(await Promise.all(options.map((option) => option.getText()))).toEqual([
      'Pumps (2)',
      'Valves (1)',
    ]);
    await options[1].click();
    expect(names()).toEqual(['Sarvane']);
    expect(page.querySelector('[role=status]')?.textContent).toBe('1 of 3 candidates');
    await options[0].click();
    expect(names().length).toBe(3);
    expect(await address()).toBe('/?with.Industry=Pumps&with.Industry=Valves');
  });

  it('reads sizes in the shown unit and keeps them in the unit of the panel', async () => {
    const { fields, names, address } = await shown();
    const [, from, to] = fields;
    await enter(from, '1.5');
    await enter(to, '2');
    expect(names()).toEqual(['Sarvane']);
    expect(await address()).toBe('/?from=1500&to=2000');
    await enter(to, 'much');
    expect(await to.getValue()).toBe('2');
  });

  it('asks for years covered, and shows all again', async () => {
    const { fields, names, address, page } = await shown();
    await enter(fields[3], '5.2');
    expect(await fields[3].getValue()).toBe('6');
    await enter(fields[3], 'many');
    expect(await fields[3].getValue()).toBe('6');
    await fields[0].setValue('vane');
    expect(names()).toEqual(['Tolvane']);
    const all = page.querySelector<HTMLButtonElement>('button.kv-link');
    all?.focus();
    all?.click();
    expect(names()).toEqual(['Kesdrin', 'Sarvane', 'Tolvane']);
    expect(await address()).toBe('/');
    expect(await fields[0].isFocused()).toBeTrue();
  });
});
