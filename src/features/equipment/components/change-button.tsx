import { Button } from '../../../components/ui/button';
import { useMay } from '../../../lib/session';

/** Leads to the form of what is open, for who may change it. */
export function ChangeButton({ onPress }: { onPress: () => void }) {
  const mayEdit = useMay('equipment.edit');
  if (!mayEdit) return null;
  return (
    <Button size="small" icon="edit" className="justify-self-start" onPress={onPress}>
      Change it
    </Button>
  );
}
