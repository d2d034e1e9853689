import { greatestPackQuantity } from '#contract/packages';
import { Icon } from '../../../components/icon';
import { Button } from '../../../components/ui/button';
import { NumberField } from '../../../components/ui/text-field';

type QuantityFieldProps = {
  /** As typed; what is no whole number from 1 to the greatest is told beside it. */
  readonly text: string;
  readonly onChange: (text: string) => void;
};

/** The quantity a text stands for; null where it stands for none. */
export function quantityOf(text: string): number | null {
  if (!/^\d{1,3}$/.test(text.trim())) return null;
  const quantity = Number(text);
  return quantity >= 1 && quantity <= greatestPackQuantity ? quantity : null;
}

/** How many of them: one more, one less, or typed. */
export function QuantityField({ text, onChange }: QuantityFieldProps) {
  const quantity = quantityOf(text);
  const step = (by: number) => {
    onChange(String(Math.min(greatestPackQuantity, Math.max(1, (quantity ?? 1) + by))));
  };
  return (
    <div className="flex items-end gap-2">
      <Button
        kind="quiet"
        className="w-12 !px-0"
        aria-label="One less"
        onPress={() => {
          step(-1);
        }}
      >
        <Icon name="minus" />
      </Button>
      <NumberField
        label="How many"
        isWhole
        className="w-20"
        value={text}
        error={quantity === null ? `1 to ${greatestPackQuantity}` : undefined}
        onChange={(event) => {
          onChange(event.target.value);
        }}
      />
      <Button
        kind="quiet"
        className="w-12 !px-0"
        aria-label="One more"
        onPress={() => {
          step(1);
        }}
      >
        <Icon name="plus" />
      </Button>
    </div>
  );
}
