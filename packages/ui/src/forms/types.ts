/** What every field takes; `error` comes from the form (`v-bind="form.field('name')"`). */
export interface FieldProps {
  label: string
  /** Path of the field in the form. */
  name?: string
  hint?: string
  error?: string
  required?: boolean
  disabled?: boolean
  readonly?: boolean
}

/** One entry of a list to choose from. */
export interface Choice<Value extends string | number = string> {
  value: Value
  label: string
  hint?: string
  disabled?: boolean
}
