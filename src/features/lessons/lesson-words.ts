/** On every lesson and on their list. */
export const notCompetency =
  'A finished lesson is no competency: that is observed at the cart and signed for by somebody.';
