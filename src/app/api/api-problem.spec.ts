import { problemType } from '@contract';
import { ApiProblem } from './api-problem';

describe('a refused request as a notice shows it', () => {
  it('says where each thing is wrong, counting from one', () => {
    const problem = new ApiProblem('bad-request', {
      type: problemType('bad-request'),
      title: 'The request is not as expected',
      status: 400,
      errors: [
        { pointer: '/marketValue', detail: '“value” is chosen for two things' },
        {
          pointer: '/conversion/currencies/rates/2/yearEnd',
          detail: 'expected a number; found nothing',
        },
        { pointer: '/', detail: 'expected an object; found nothing' },
      ],
    });
    expect(problem.shown.places).toEqual([
      'market value: “value” is chosen for two things',
      'conversion, currencies, rates 3, year end: expected a number; found nothing',
      'expected an object; found nothing',
    ]);
  });
});
