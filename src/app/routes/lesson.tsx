import { findRuleId } from '#domain/lessons/finish-lesson';
import { useParams } from 'react-router-dom';
import { LessonPage } from '../../features/lessons/components/lesson-page';
import { NotFound } from '../not-found';

export function Component() {
  const ruleId = findRuleId(useParams().ruleId);
  return ruleId === undefined ? <NotFound sentence="There is no such lesson." /> : <LessonPage ruleId={ruleId} />;
}
