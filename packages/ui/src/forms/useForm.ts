import { computed, nextTick, reactive, ref, shallowRef, toRaw, watch, type ComputedRef, type Ref } from 'vue'
import { formWords } from '../strings/interface'
import { readDraft, writeDraft } from './drafts'
import { copy, getPath, same, setPath } from './paths'
import { fieldPath, toShownProblem, type FieldProblem } from './problem'
import { useLeaveGuard, type LeaveGuard } from './useLeaveGuard'

export interface UseFormOptions<Values extends object, Result> {
  initial: Values
  /** Sends the values; what it throws is shown, by field where it names one. */
  submit(values: Values): Promise<Result>
  /** Keeps what was typed across a reload, under this name; different for every record edited. */
  storageKey?: string
  /** Checks that need no server: messages by field path; nothing is sent while there are any. */
  validate?(values: Values): Record<string, string | undefined>
  /** After a successful submit; the form is clean by then, so it may navigate. */
  done?(result: Result): unknown
}

/** What a field component takes: `v-bind="form.field('resolution')"`. */
export interface FieldBinding<Value = never> {
  name: string
  modelValue: Value
  error: string | undefined
  'onUpdate:modelValue'(value: unknown): void
}

export interface Form<Values extends object> {
  values: Values
  errors: Record<string, string | undefined>
  /** Errors of the server that belong to none of the form's fields. */
  otherErrors: Ref<FieldProblem[]>
  /** What the last submit failed with; for ProblemNotice. */
  problem: Ref<unknown>
  busy: Ref<boolean>
  dirty: ComputedRef<boolean>
  /** Values of an earlier visit were put back. */
  restored: Ref<boolean>
  leaving: LeaveGuard
  field<Value = never>(path: string): FieldBinding<Value>
  submit(): Promise<boolean>
  /** Back to the initial values, or on to new ones; forgets what was typed. */
  reset(values?: Values): void
}

/** Puts the cursor into the first field, in page order, whose error is shown. */
async function focusFirstError(errors: Record<string, string | undefined>): Promise<void> {
  await nextTick()
  const fields = [...document.querySelectorAll<HTMLElement>('[data-field]')]
  const first = fields.find((field) => errors[field.dataset.field ?? ''])
  const control = first?.querySelector<HTMLElement>('input, textarea, select, button, [tabindex]')
  if (control) control.focus()
  else document.querySelector<HTMLElement>('.problem-notice')?.scrollIntoView({ block: 'nearest' })
}

/**
 * State and behaviour of one form: keeps what was typed across a failed request and a reload, puts the server's
 * errors at their fields, focuses the first, and asks before unsaved work is left. Call in a component's setup;
 * `FormFrame` shows it.
 */
export function useForm<Values extends object, Result = unknown>(
  options: UseFormOptions<Values, Result>,
): Form<Values> {
  const { storageKey } = options
  const baseline = shallowRef(copy(options.initial))
  const values = reactive(copy(options.initial)) as Values
  const errors = reactive<Record<string, string | undefined>>({})
  const otherErrors = ref<FieldProblem[]>([])
  const problem = shallowRef<unknown>()
  const busy = ref(false)
  const restored = ref(false)
  const fields = new Set<string>()
  const dirty = computed(() => !same(values, baseline.value))

  const draft = readDraft(storageKey)
  if (typeof draft === 'object' && draft !== null && !Array.isArray(draft)) {
    // Only what the form knows is taken back: a draft of an older version may hold other fields.
    for (const key of Object.keys(values)) if (key in draft) setPath(values, key, getPath(draft, key))
    restored.value = dirty.value
  }

  watch(values, () => writeDraft(storageKey, dirty.value ? toRaw(values) : undefined), {
    deep: true,
    flush: 'post',
  })

  const leaving = useLeaveGuard(dirty, () => writeDraft(storageKey, undefined))

  function clearErrors() {
    for (const key of Object.keys(errors)) delete errors[key]
    otherErrors.value = []
    problem.value = undefined
  }

  /** The form's field an error path belongs to: itself or the nearest field above it. */
  function ownerOf(path: string): string | undefined {
    const keys = fieldPath(path).split('.')
    for (let length = keys.length; length > 0; length -= 1) {
      const candidate = keys.slice(0, length).join('.')
      if (fields.has(candidate)) return candidate
    }
    return undefined
  }

  function take(thrown: unknown) {
    problem.value = thrown
    for (const error of toShownProblem(thrown).errors) {
      const owner = ownerOf(error.path)
      if (owner === undefined) otherErrors.value.push(error)
      else errors[owner] ??= error.message
    }
  }

  function field<Value = never>(path: string): FieldBinding<Value> {
    fields.add(path)
    return {
      name: path,
      modelValue: getPath(values, path) as Value,
      error: errors[path],
      'onUpdate:modelValue'(value) {
        setPath(values, path, value)
        delete errors[path]
      },
    }
  }

  function replace(next: Values) {
    baseline.value = copy(next)
    for (const key of Object.keys(values)) if (!(key in next)) delete (values as Record<string, unknown>)[key]
    Object.assign(values, copy(next))
    restored.value = false
    writeDraft(storageKey, undefined)
  }

  async function submit(): Promise<boolean> {
    if (busy.value) return false
    clearErrors()
    for (const [path, message] of Object.entries(options.validate?.(values) ?? {}))
      if (message) errors[path] = message
    if (Object.keys(errors).length) {
      problem.value = { code: 'invalid-input', detail: formWords.seeFields }
      await focusFirstError(errors)
      return false
    }
    busy.value = true
    const sent = copy(toRaw(values))
    try {
      const result = await options.submit(sent)
      // What was typed while the request was under way stays, as a change against what was saved.
      baseline.value = sent
      restored.value = false
      writeDraft(storageKey, dirty.value ? toRaw(values) : undefined)
      await options.done?.(result)
      return true
    } catch (thrown) {
      take(thrown)
      await focusFirstError(errors)
      return false
    } finally {
      busy.value = false
    }
  }

  return {
    values,
    errors,
    otherErrors,
    problem,
    busy,
    dirty,
    restored,
    leaving,
    field,
    submit,
    reset(next) {
      clearErrors()
      replace(next ?? baseline.value)
    },
  }
}
