import { describe, expect, it } from 'vitest';
import { ruleIds } from '#domain/load/finding';
import { lessonOf } from '#domain/lessons/all-lessons';
import { decideFinishLesson, findRuleId } from '#domain/lessons/finish-lesson';
import { answerIds, type AnswerId } from '#domain/lessons/lesson';

const ruleId = 'lid-filter-covered';
const { right } = lessonOf(ruleId).question;
const [oneWrong, otherWrong] = answerIds.filter((id) => id !== right) as [AnswerId, AnswerId];

describe('a lesson is finished', () => {
  it('with the right answer at the first try', () => {
    expect(decideFinishLesson(ruleId, [right])).toEqual({ ok: true, value: { ruleId, tries: 1 } });
  });

  it('with the right answer after one or both wrong ones, and the tries are counted', () => {
    expect(decideFinishLesson(ruleId, [oneWrong, right])).toMatchObject({ ok: true, value: { tries: 2 } });
    expect(decideFinishLesson(ruleId, [otherWrong, oneWrong, right])).toMatchObject({ ok: true, value: { tries: 3 } });
  });

  it.each<[string, readonly AnswerId[]]>([
    ['no answer', []],
    ['a wrong answer', [oneWrong]],
    ['a wrong answer after the right one', [right, oneWrong]],
  ])('but not with %s', (_what, answers) => {
    expect(decideFinishLesson(ruleId, answers)).toMatchObject({ refusal: { code: 'lesson.not-answered-right' } });
  });

  it.each<[string, readonly AnswerId[]]>([
    ['the right answer twice', [right, right]],
    ['the same wrong answer twice', [oneWrong, oneWrong, right]],
  ])('nor with %s', (_what, answers) => {
    expect(decideFinishLesson(ruleId, answers)).toMatchObject({ refusal: { code: 'lesson.tries-do-not-fit' } });
  });

  it('nor of a rule there is not', () => {
    for (const none of ['no-such-rule', '', '__proto__', 'constructor']) {
      expect(decideFinishLesson(none, [right])).toMatchObject({ refusal: { code: 'lesson.none' } });
    }
  });

  it('for each rule with exactly one of the three answers', () => {
    for (const id of ruleIds) {
      expect(answerIds.filter((answer) => decideFinishLesson(id, [answer]).ok)).toHaveLength(1);
    }
  });
});

it('finds rules by their own ids only', () => {
  expect(findRuleId('facing')).toBe('facing');
  expect(findRuleId('Facing')).toBeUndefined();
  expect(findRuleId(undefined)).toBeUndefined();
});
