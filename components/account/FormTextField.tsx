import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { TextField, type TextFieldProps } from '../ui/TextField';

interface FormTextFieldProps<Values extends FieldValues> extends Omit<TextFieldProps, 'value' | 'onChangeText' | 'error' | 'onBlur' | 'inputRef'> {
  control: Control<Values>;
  name: FieldPath<Values>;
}

/** A text field of a form: its value, and its error in words at the field. */
export function FormTextField<Values extends FieldValues>({ control, name, ...rest }: FormTextFieldProps<Values>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <TextField {...rest} value={String(field.value ?? '')} onChangeText={field.onChange} onBlur={field.onBlur} inputRef={field.ref} error={fieldState.error?.message} />
      )}
    />
  );
}
