import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../../ui/number-format';
import { PageContext } from '../../ui/page-context';

/** Numbers as a page on the example panel writes them: EUR, in millions. */
export function exampleNumbers(): NumberFormat {
  TestBed.inject(PageContext).show({ currency: 'EUR', unit: 'millions' });
  return TestBed.inject(NumberFormat);
}
