interface Props {
  /** Name of the group, read before its choices. */
  legend: string;
  name: string;
  options: { value: string; label: string }[];
  value?: string;
  defaultValue?: string;
  onChoose?: (value: string) => void;
  className?: string;
}

/** A few choices side by side, one taken: phase, visibility, theme. Works as a plain form control. */
export function ChoiceRow({
  legend,
  name,
  options,
  value,
  defaultValue,
  onChoose,
  className = '',
}: Props) {
  return (
    <fieldset className={`seg ${className}`}>
      <legend className="sr-only">{legend}</legend>
      {options.map((option) => (
        <label key={option.value} className="cursor-pointer">
          <input
            className="sr-only"
            type="radio"
            name={name}
            value={option.value}
            onChange={onChoose && (() => onChoose(option.value))}
            {...(value === undefined
              ? { defaultChecked: option.value === defaultValue }
              : { checked: option.value === value })}
          />
          {option.label}
        </label>
      ))}
    </fieldset>
  );
}
