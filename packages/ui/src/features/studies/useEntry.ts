import { studies } from '@evenrule/api/contract'
import { computed, ref, shallowRef, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import { useForm, type Form } from '../../forms/useForm'
import { useApi } from '../../session/client'
import { useSession } from '../../session/useSessionStore'
import { orNull, useHere, type Loaded } from '../common'
import { entryInput, entryProblems, entryStart, nothingChosen, shownInput, type EntryValues } from './entry'
import { countingData, keptReadings } from './studyText'
import { useAsked } from './useAsked'

export interface Entry {
  form: Form<EntryValues>
  file: ShallowRef<File | undefined>
  preview: Loaded<studies.ReadingsPreview | null>
  /** True computes, false keeps. */
  complete: Ref<boolean>
  kept: ComputedRef<number>
  /** Readings that stand before those entered here. */
  before(): number
  /** Takes the file to read. */
  choose(file: File): void
  /** Takes another sheet; what was chosen of the sheet before counts no longer. */
  chooseSheet(sheet: string): void
  /** Reads anew without what is remembered and what was chosen. */
  detect(): void
  /** Whether everything that can be checked here is in order. */
  ready(): boolean
}

const localToday = (): string => {
  const now = new Date()
  return [now.getFullYear(), now.getMonth() + 1, now.getDate()]
    .map((part) => String(part).padStart(2, '0'))
    .join('-')
}

/** Entering, or correcting, the readings of a study: what is typed, how the server reads it, and storing it. */
export function useEntry(
  study: studies.Study,
  correcting: boolean,
  done: (study: studies.Study) => void,
): Entry {
  const api = useApi()
  const here = useHere()
  const session = useSession()
  const at = here.params({ studyId: study.id })
  const file = shallowRef<File>()
  const complete = ref(true)
  const last = countingData(study)
  const kept = computed(() => (correcting ? 0 : keptReadings(study)))

  const problems = (values: EntryValues) =>
    entryProblems(values, {
      hasInput: entryInput(values, Boolean(file.value)) !== null,
      preview: preview.data.value ?? null,
      correcting,
    })
  const form: Form<EntryValues> = useForm({
    initial: entryStart({
      planned: study.plannedReadings,
      kept: kept.value,
      texts: correcting ? (last?.texts ?? []) : [],
      today: last?.collectedOn ?? localToday(),
      me: session.person?.id ?? '',
      appraiser: last?.appraiser ?? '',
    }),
    storageKey: `readings.${study.id}${correcting ? '.correct' : ''}`,
    validate: problems,
    submit: (values) =>
      api.call(studies.storeReadings, {
        params: at,
        body: {
          ...toStore(values),
          append: values.append,
          expectedVersion: study.rowVersion,
          complete: complete.value,
          leaveOutBadRows: values.leaveOutBadRows,
          collectedOn: values.collectedOn,
          takenBy: values.takenBy,
          appraiser: values.appraiser.trim(),
          reason: orNull(values.reason),
        },
        ...(values.source === 'uploaded' && file.value ? { file: file.value } : {}),
      }),
    done,
  })

  /** As it is shown, once the answer on what is entered now is there. */
  function toStore(values: EntryValues) {
    const input = entryInput(values, Boolean(file.value)) ?? { source: values.source }
    const { data, loading, error } = preview
    return shownInput(input, loading.value || error.value ? null : (data.value ?? null))
  }

  const stamp = computed(() => file.value && [file.value.name, file.value.size, file.value.lastModified])
  const preview = useAsked(
    () => {
      const input = entryInput(form.values, Boolean(file.value))
      const { append, asRemembered } = form.values
      return input && { body: { ...input, append, asRemembered }, stamp: stamp.value }
    },
    ({ body }) =>
      api.call(studies.previewReadings, {
        params: at,
        body,
        ...(body.source === 'uploaded' && file.value ? { file: file.value } : {}),
      }),
  )
  const take = (values: Partial<EntryValues>) => {
    for (const [name, value] of Object.entries(values)) form.field(name)['onUpdate:modelValue'](value)
  }
  return {
    form,
    file,
    preview,
    complete,
    kept,
    before: () => (form.values.append ? kept.value : 0),
    choose(chosen) {
      if (chosen.name !== form.values.file) take(nothingChosen())
      file.value = chosen
      form.field('file')['onUpdate:modelValue'](chosen.name)
    },
    chooseSheet: (sheet) => take({ ...nothingChosen(), sheet }),
    detect: () => take({ ...nothingChosen(), asRemembered: false }),
    ready: () => Object.values(problems(form.values)).every((problem) => problem === undefined),
  }
}
