import { studies } from '@evenrule/api/contract'
import { computed, ref, shallowRef, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import { useForm, type Form } from '../../forms/useForm'
import { useApi } from '../../session/client'
import { useSession } from '../../session/useSessionStore'
import { orNull, useHere, type Loaded } from '../common'
import { entryInput, entryProblems, entryStart, type EntryValues } from './entry'
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
          ...(entryInput(values, Boolean(file.value)) ?? { source: values.source }),
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

  const stamp = computed(() => file.value && [file.value.name, file.value.size, file.value.lastModified])
  const preview = useAsked(
    () => {
      const input = entryInput(form.values, Boolean(file.value))
      return input && { body: { ...input, append: form.values.append }, stamp: stamp.value }
    },
    ({ body }) =>
      api.call(studies.previewReadings, {
        params: at,
        body,
        ...(body.source === 'uploaded' && file.value ? { file: file.value } : {}),
      }),
  )
  return {
    form,
    file,
    preview,
    complete,
    kept,
    before: () => (form.values.append ? kept.value : 0),
    choose(chosen) {
      file.value = chosen
      form.field('file')['onUpdate:modelValue'](chosen.name)
    },
    ready: () => Object.values(problems(form.values)).every((problem) => problem === undefined),
  }
}
