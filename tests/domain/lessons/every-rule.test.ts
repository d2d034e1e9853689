import { describe, expect, it } from 'vitest';
import { ruleIds } from '#domain/load/finding';
import { layOut } from '#domain/load/layout';
import { lessonOf, ruleOf } from '#domain/lessons/all-lessons';
import { judgeLesson } from '#domain/lessons/judge-lesson';
import { answerIds } from '#domain/lessons/lesson';
import { readingSeconds, textOfLesson } from '#domain/lessons/reading-time';

describe.each(ruleIds)('the lesson of %s', (ruleId) => {
  const lesson = lessonOf(ruleId);
  const { bad, good } = judgeLesson(ruleId);

  it('has a bad cart on which exactly its rule finds something, but for what it names beside it', () => {
    const found = [...new Set(bad.map((finding) => finding.ruleId))].sort();
    expect(found).toEqual([ruleId, ...(lesson.alongside ?? [])].sort());
  });

  it('has a good cart on which no rule finds anything', () => {
    expect(good.map(({ title }) => title)).toEqual([]);
  });

  it('draws things the catalogue of its cart knows, on shelves and in holders the cart has', () => {
    for (const { view } of [lesson.bad, lesson.good]) {
      const layout = layOut(view);
      const shelves = new Set(view.cart.shelves.map((shelf) => shelf.id));
      for (const picture of lesson.pictures) {
        if (picture.of === 'shelf') expect(shelves).toContain(picture.shelfId);
        if (picture.of === 'holder') expect([...layout.holderOf.keys()]).toContain(picture.holderId);
      }
      expect(layout.bodies.length).toBeGreaterThan(0);
    }
  });

  it('asks for three different answers, each with a reason of its own', () => {
    const { answers } = lesson.question;
    expect(new Set(answerIds.map((id) => answers[id].text)).size).toBe(3);
    expect(new Set(answerIds.map((id) => answers[id].because)).size).toBe(3);
    for (const id of answerIds) expect(answers[id].because).toMatch(/^\S.*[.?]$/);
  });

  it('is read in 90 seconds, and in no fewer than 30', () => {
    // 180 words a minute: three words a second.
    const words = textOfLesson(ruleId).split(/\s+/).length;
    expect(words / 3).toBeLessThanOrEqual(90);
    expect(words / 3).toBeGreaterThanOrEqual(30);
    expect(readingSeconds(ruleId)).toBeLessThanOrEqual(90);
  });

  it('gives the reason in two or three short sentences a piece', () => {
    expect(lesson.why.length).toBeGreaterThanOrEqual(2);
    expect(lesson.why.length).toBeLessThanOrEqual(3);
    for (const sentence of [...lesson.why, lesson.lookFor, lesson.bad.caption, lesson.good.caption]) {
      expect(sentence.split(/\s+/).length).toBeLessThanOrEqual(32);
      expect(sentence).toMatch(/^\S.*[.?]$/);
    }
  });

  it('does not say its source itself: the rule does', () => {
    const own = JSON.stringify({ why: lesson.why, lookFor: lesson.lookFor, question: lesson.question });
    expect(own).not.toContain(ruleOf(ruleId).source.text);
    expect(own).not.toMatch(/CDC|FDA|RACGP|AAMI|ISO \d|EN \d|New Jersey/);
  });
});

describe('the lessons together', () => {
  it('have their right answers at each of the three places about as often', () => {
    for (const id of answerIds) {
      const share = ruleIds.filter((ruleId) => lessonOf(ruleId).question.right === id).length / ruleIds.length;
      expect(share).toBeGreaterThan(0.2);
      expect(share).toBeLessThan(0.45);
    }
  });

  it('do not give the right answer away by its length', () => {
    const longest = ruleIds.filter((ruleId) => {
      const { answers, right } = lessonOf(ruleId).question;
      return answerIds.every((id) => id === right || answers[id].text.length < answers[right].text.length);
    });
    expect(longest.length / ruleIds.length).toBeLessThan(0.5);
  });

  it('never show a bad cart and a good cart that are the same', () => {
    const same = ruleIds.filter((ruleId) => {
      const { bad, good } = lessonOf(ruleId);
      return JSON.stringify(bad.view) === JSON.stringify(good.view);
    });
    expect(same).toEqual([]);
  });
});
