import { LessonList } from '../../features/lessons/components/lesson-list';

export function Component() {
  return <LessonList />;
}
