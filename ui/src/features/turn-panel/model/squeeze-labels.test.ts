import { labelPlaces, labelPlacesBackward } from './squeeze-labels';

describe('places of things of one width', () => {
  it('queue to the right, or to the left', () => {
    expect(labelPlaces([10, 12, 60], 15)).toEqual([10, 25, 60]);
    expect(labelPlacesBackward([10, 58, 60], 15)).toEqual([10, 45, 60]);
  });
});
