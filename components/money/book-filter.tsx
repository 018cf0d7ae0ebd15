import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/field";

interface BookFilterProps {
  action: string;
  month?: string | undefined;
  /** What the list can be narrowed to: an account, or a place. */
  choice: { name: string; label: string; value?: string | undefined; options: { value: string; label: string }[] };
  /** What else the address narrows the list to, kept over the form. */
  kept: Record<string, string>;
}

/** Month and account (or place) as a plain form in the address, so that a list can be linked to. */
export function BookFilter({ action, month, choice, kept }: BookFilterProps) {
  return (
    <form method="get" action={action} className="filter-form">
      {Object.entries(kept).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <TextField id="month" name="month" label="Month" type="month" placeholder="2026-03" defaultValue={month} />
      <SelectField id={choice.name} name={choice.name} label={choice.label} defaultValue={choice.value ?? ""}>
        <option value="">All</option>
        {choice.options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </SelectField>
      <Button type="submit" variant="line">
        Show
      </Button>
      {Object.keys(kept).length > 0 || month !== undefined || choice.value !== undefined ? (
        <Button variant="line" href={action}>
          Show all
        </Button>
      ) : null}
    </form>
  );
}
