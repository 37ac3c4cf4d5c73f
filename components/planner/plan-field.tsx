import { useController, useFormContext, type FieldPathByValue } from 'react-hook-form';
import { useProblemOf } from '@/components/planner/plan-form';
import { TextField, type TextFieldProps } from '@/components/ui/field';
import { type DraftPlan } from '@/shared/entries/draft-plan';

type TextPath = FieldPathByValue<DraftPlan, string>;
type Props = {
  readonly name: TextPath;
  /** Told after the draft has the new text. */
  readonly onAfterChange?: (text: string) => void;
} & Omit<TextFieldProps, 'value' | 'onChangeText' | 'error' | 'onBlur'>;

/** A text field of the draft, with its problem beside it. */
export function PlanField({ name, onAfterChange, ...props }: Props) {
  const { control } = useFormContext<DraftPlan>();
  const { field } = useController({ control, name });
  const problem = useProblemOf(name);
  const change = (text: string) => {
    field.onChange(text);
    onAfterChange?.(text);
  };
  return <TextField {...props} value={field.value} onChangeText={change} onBlur={field.onBlur} error={problem} />;
}
