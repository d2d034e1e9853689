import type { Lesson } from '../lesson';
import { basicSet, drapes, lower, upper } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

export const metalOverTextileLesson: Lesson = {
  family: 'mass-and-water',
  why: [
    'Steam becomes water on cold metal, and the water drips.',
    'A textile pack below drinks it. A wet pack is not sterile, however long it dries.',
    'Textiles above metal stay dry.',
  ],
  lookFor: 'Metal low, textiles high, nothing metal over cloth.',
  bad: {
    view: aLoad({ packages: [onShelf(drapes, lower, 60, 130), onShelf(basicSet, upper, 20, 70)] }),
    caption: 'The set drips on the drapes below it.',
  },
  good: {
    view: aLoad({ packages: [onShelf(drapes, upper, 60, 130), onShelf(basicSet, lower, 20, 70)] }),
    caption: 'Changed over: whatever drips meets no cloth.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'There is room for drapes only on the lower shelf. What can you do?',
    right: 'c',
    answers: {
      a: { text: 'Cover them with a sheet of paper.', because: 'Paper gets wet and keeps steam from the pack.' },
      b: { text: 'Choose a longer drying time.', because: 'What has soaked in does not come out in time.' },
      c: { text: 'Clear what is metal from above them.', because: 'With nothing metal above, nothing drips.' },
    },
  },
};
