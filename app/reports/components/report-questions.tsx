import type { ReactNode } from 'react'
import { Choices, Segments } from '~/ui/choice'
import { DateField, Field, Select, TextArea } from '~/ui/field'
import {
  depths,
  depthWords,
  edgeAnswers,
  edgeAnswerWords,
  looseAnswers,
  looseWords,
  otherAnswers,
  otherWords,
  rustAnswers,
  rustWords,
  topics,
  topicWords,
} from '../questions'
import { howSeen, howSeenWords } from '../report'

type Typed = Record<string, string | string[]>

interface Asked {
  typed: Typed
  errors: Record<string, string>
}

const options = <T extends string>(values: readonly T[], words: Record<T, string>) =>
  values.map(value => ({ value, label: words[value] }))

const one = (typed: Typed, name: string) => [typed[name]].flat()[0]
const many = (typed: Typed, name: string) => [typed[name] ?? []].flat()

/** Everything the report form asks: what is wrong, its measures, how and when it was seen, words, a guest's address. */
export function ReportQuestions(
  props: Asked & { parts: { id: string; words: string }[]; today: string; guest: boolean },
) {
  const { typed, errors } = props
  return (
    <>
      <Choices
        legend="What is wrong?"
        hideLegend
        type="checkbox"
        name="topic"
        options={topics.map(value => ({ value, ...topicWords[value] }))}
        chosen={many(typed, 'topic')}
        error={errors.topic}
      />
      <GrooveQuestions {...props} />
      <Questions topic="sharp">
        <Edge name="sharpEdge" legend="What is the edge like?" {...props} />
      </Questions>
      <Questions topic="loose">
        <Choices
          legend="What is loose?"
          type="checkbox"
          name="loose"
          options={options(looseAnswers, looseWords)}
          chosen={many(typed, 'loose')}
          error={errors.loose}
        />
      </Questions>
      <Questions topic="rust">
        <Choices
          legend="How much rust?"
          type="radio"
          name="rust"
          options={options(rustAnswers, rustWords)}
          chosen={many(typed, 'rust')}
          error={errors.rust}
        />
      </Questions>
      <Questions topic="other">
        <Choices
          legend="What else?"
          type="radio"
          name="else"
          options={options(otherAnswers, otherWords)}
          chosen={many(typed, 'else')}
          error={errors.else}
        />
      </Questions>
      {props.parts.length > 1 && (
        <div className="mt-6">
          <Select
            label="On which part?"
            name="part"
            defaultValue={one(typed, 'part') ?? ''}
            options={[
              { value: '', label: 'not sure' },
              ...props.parts.map(({ id, words }) => ({ value: id, label: words })),
            ]}
            error={errors.part}
          />
        </div>
      )}
      <SeenQuestions {...props} />
    </>
  )
}

function Questions({ topic, children }: { topic: string; children: ReactNode }) {
  return <div className={`topic-questions topic-${topic} mt-5`}>{children}</div>
}

function Edge({ name, legend, typed, errors }: Asked & { name: string; legend: string }) {
  return (
    <Choices
      legend={legend}
      type="radio"
      name={name}
      options={options(edgeAnswers, edgeAnswerWords)}
      chosen={many(typed, name)}
      error={errors[name]}
    />
  )
}

function GrooveQuestions({ typed, errors }: Asked) {
  return (
    <Questions topic="groove">
      <Segments
        legend="How deep is the groove?"
        name="depth"
        options={depths.map(value => ({ value, label: depthWords[value].label }))}
        chosen={one(typed, 'depth')}
        error={errors.depth}
      />
      <div className="mt-4 max-w-60">
        <Field
          label="Measured, in mm"
          hint="Only if you could measure it, for example 3.3"
          name="depthMm"
          inputMode="decimal"
          defaultValue={one(typed, 'depthMm')}
          error={errors.depthMm}
        />
      </div>
      <div className="mt-4">
        <Edge name="grooveEdge" legend="What are its edges like?" typed={typed} errors={errors} />
      </div>
    </Questions>
  )
}

function SeenQuestions({ typed, errors, today, guest }: Asked & { today: string; guest: boolean }) {
  return (
    <div className="mt-6 grid gap-5">
      <div className="grid gap-5 sm:grid-cols-2">
        <Select
          label="How did you see it?"
          name="howSeen"
          defaultValue={one(typed, 'howSeen') ?? 'on_it'}
          options={howSeen.map(value => ({ value, label: howSeenWords[value] }))}
          error={errors.howSeen}
        />
        <DateField
          label="Seen on"
          name="seenOn"
          max={today}
          defaultValue={one(typed, 'seenOn') ?? today}
          error={errors.seenOn}
        />
      </div>
      <TextArea
        label="In your words"
        hint="Where on it, what it does, what you did. Not public until a coordinator has looked."
        name="words"
        rows={3}
        defaultValue={one(typed, 'words')}
        error={errors.words}
      />
      {guest && (
        <Field
          label="Your e-mail address"
          hint="So that we can ask back and tell you when it is mended. Never shown to the public."
          name="email"
          type="email"
          autoComplete="email"
          defaultValue={one(typed, 'email')}
          error={errors.email}
        />
      )}
    </div>
  )
}
