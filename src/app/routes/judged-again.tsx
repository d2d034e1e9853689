import { useParams } from 'react-router-dom';
import { JudgedAgainScreen } from '../../features/policies/components/judged-again-screen';

export function Component() {
  const loadId = useParams().loadId ?? '';
  return <JudgedAgainScreen key={loadId} loadId={loadId} />;
}
