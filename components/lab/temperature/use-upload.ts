import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { askOffice } from '@/components/lab/ask-office';
import { decodeText } from '@/lib/brood/temperature/csv/decode-text';
import type { FileAnswers } from '@/lib/brood/temperature/csv/layout';
import type { PreviewView } from './temperature-shapes';

/** A file somebody chose. */
interface ChosenFile {
  name: string;
  text: string;
}

/** A file on its way to being kept. */
export interface Upload {
  file: ChosenFile | null;
  answers: FileAnswers;
  preview: PreviewView | null;
  isBusy: boolean;
  /** What failed, in words. */
  trouble: string | null;
  choose: (file: File) => void;
  answer: (answers: FileAnswers) => void;
  reset: () => void;
}

/** Reads a file on this device and lets the office say what it is; nothing is kept by that. */
export function useUpload(nest: string): Upload {
  const [file, setFile] = useState<ChosenFile | null>(null);
  const [answers, setAnswers] = useState<FileAnswers>({});
  const look = useMutation({
    mutationFn: async (asked: { file: ChosenFile; answers: FileAnswers }) => {
      const path = `/api/nests/${nest}/temperature/preview`;
      return askOffice({ method: 'POST', path, body: { text: asked.file.text, answers: asked.answers } }, fetch);
    },
  });
  const choose = async (chosen: File): Promise<void> => {
    const next = { name: chosen.name, text: decodeText(new Uint8Array(await chosen.arrayBuffer())) };
    setFile(next);
    setAnswers({});
    look.mutate({ file: next, answers: {} });
  };
  return {
    ...{ file, answers },
    // The office answers in the shape of its own preview.
    preview: look.data?.ok ? (look.data.answer as PreviewView) : null,
    isBusy: look.isPending,
    trouble: look.data && !look.data.ok ? look.data.words : null,
    choose: (chosen) => void choose(chosen),
    answer: (more) => {
      const next = { ...answers, ...more };
      setAnswers(next);
      if (file) look.mutate({ file, answers: next });
    },
    reset: () => {
      setFile(null);
      look.reset();
    },
  };
}
