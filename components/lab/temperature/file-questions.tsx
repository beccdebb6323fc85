import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import type { FileAnswers, FileQuestion } from '@/lib/brood/temperature/csv/layout';

interface FileQuestionsProps {
  questions: readonly FileQuestion[];
  onAnswer: (answers: FileAnswers) => void;
}

function answerOf(question: FileQuestion, value: string): FileAnswers {
  if (question.code === 'column') return { column: Number(value) };
  const choice = question.choices.find((offered) => offered.value === value);
  if (!choice) return {};
  return choice.value === 'C' || choice.value === 'F'
    ? { unit: choice.value }
    : { order: choice.value as 'dmy' | 'mdy' };
}

/** What the file leaves open, each with its answers as keys. Nothing is guessed. */
export function FileQuestions({ questions, onAnswer }: FileQuestionsProps): ReactElement {
  return (
    <div className="flex flex-col gap-4">
      {questions.map((question) => (
        <fieldset key={question.code}>
          <legend className="mb-2 font-bold">{question.text}</legend>
          <div className="flex flex-wrap gap-2">
            {question.choices.map(({ value, label }) => (
              <Button key={value} onClick={() => onAnswer(answerOf(question, value))}>
                {label}
              </Button>
            ))}
          </div>
        </fieldset>
      ))}
    </div>
  );
}
