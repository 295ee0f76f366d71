// What follows from a recipe's measurements: a pedal's ratio, its travel.
import type { Fact, Params, PartRecipe } from '#shared/parts';
import { formatAngle, formatLength, formatPercent, type LengthDisplay } from '#shared/units';
import { useFacts } from '../bench-model';

function say({ unit, value }: Fact, display: LengthDisplay): string {
  if (unit === 'length') return formatLength(value, display);
  if (unit === 'angle') return formatAngle(value);
  return unit === 'share' ? formatPercent(value) : `${value.toFixed(1)} : 1`;
}

export function RecipeFactsList({ recipe, params }: { readonly recipe: PartRecipe; readonly params: Params }) {
  const { display } = useFacts();
  const facts = recipe.facts(params);
  if (facts.length === 0) return null;
  return (
    <dl className="recipe-facts">
      {facts.map((fact) => (
        <div key={fact.key}>
          <dt>{fact.label}</dt>
          <dd className="figures">{say(fact, display)}</dd>
        </div>
      ))}
    </dl>
  );
}
