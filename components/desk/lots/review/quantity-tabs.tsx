import { quantityLooks } from '@/components/charts/quality/quantity-look';
import { PointMark } from '@/components/ui/point-mark';
import { chartQuantities, type ChartQuantity } from '@/lib/contracts/lot-review';

interface QuantityTabsProps {
  value: ChartQuantity;
  onChange: (quantity: ChartQuantity) => void;
}

/** Which quantity the charts show; the chosen one stands underlined in its colour. */
export function QuantityTabs({ value, onChange }: QuantityTabsProps) {
  return (
    <div role="group" aria-label="Quantity" className="flex flex-wrap items-center gap-x-5 gap-y-1">
      {chartQuantities.map((quantity) => {
        const { name, colour, point } = quantityLooks[quantity];
        const chosen = quantity === value;
        return (
          <button
            key={quantity}
            type="button"
            aria-pressed={chosen}
            onClick={() => onChange(quantity)}
            className={
              chosen
                ? 'min-h-[30px] border-b-[3px] border-current font-bold max-sm:min-h-[46px]'
                : 'sw-link min-h-[30px] max-sm:min-h-[46px]'
            }
            style={chosen ? { color: colour } : undefined}
          >
            {chosen && point ? <PointMark point={point} /> : null} {name}
          </button>
        );
      })}
    </div>
  );
}
