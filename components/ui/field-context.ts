import { createContext, useContext } from 'react';

export type FieldState = { id: string; describedBy: string | undefined; invalid: boolean; required: boolean };

export const FieldContext = createContext<FieldState | null>(null);

/** What a control inside a field needs to be tied to its label, hint and error. Props given directly win. */
export function useFieldProps<
  P extends {
    id?: string;
    'aria-describedby'?: string;
    'aria-invalid'?: boolean | 'true' | 'false' | 'grammar' | 'spelling';
  },
>(props: P): P {
  const field = useContext(FieldContext);
  if (!field) return props;
  return {
    ...props,
    id: props.id ?? field.id,
    'aria-describedby': props['aria-describedby'] ?? field.describedBy,
    'aria-invalid': props['aria-invalid'] ?? (field.invalid || undefined),
    ...(field.required ? { 'aria-required': true } : {}),
  };
}
