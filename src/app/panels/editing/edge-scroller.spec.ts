import { waysPast } from './edge-scroller';

const box = { left: 100, top: 200, right: 300, bottom: 500 };

describe('the ways in which a point is past a box', () => {
  it('are none within it', () => {
    expect(waysPast(box, 100, 200, 0)).toEqual([]);
    expect(waysPast(box, 200, 350, 28)).toEqual([]);
  });

  it('are one at an edge and two at a corner', () => {
    expect(waysPast(box, 200, 501, 0)).toEqual(['down']);
    expect(waysPast(box, 99, 350, 0)).toEqual(['left']);
    expect(waysPast(box, 301, 199, 0)).toEqual(['up', 'right']);
  });

  it('begin before the edge by the margin', () => {
    expect(waysPast(box, 290, 480, 28)).toEqual(['down', 'right']);
  });
});
