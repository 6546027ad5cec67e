'use client';
import { useState } from 'react';
import { plateProposal } from '@/lib/evidence/tlc/proposal-schema';
import { api, ApiError } from '@/lib/http/client';
import type { Proposal } from './proposals';

export type SuggestionState = { step: 'none' | 'asking' | 'answered' } | { step: 'failed'; words: string };

const notUnderstood =
  'The server proposed something that this page does not understand. Mark the plate by hand.';

/** Asks the server what could be marked on a photo. Nothing is saved by it. */
export function useSuggestion(evidenceId: string, onProposal: (proposal: Proposal) => void) {
  const [state, setState] = useState<SuggestionState>({ step: 'none' });
  async function ask() {
    setState({ step: 'asking' });
    try {
      const answer = await api(`/api/v1/evidence/${evidenceId}/plate-suggestion`, { method: 'POST' });
      const { data, success } = plateProposal.safeParse(answer);
      if (!success) return setState({ step: 'failed', words: notUnderstood });
      onProposal(data);
      setState({ step: 'answered' });
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      const words =
        error.status === 0
          ? 'The server cannot be reached. Mark the plate by hand, or ask again when the network is back.'
          : `${error.detail} You can mark the plate by hand all the same.`;
      setState({ step: 'failed', words });
    }
  }
  return { state, ask };
}

export type SuggestionHandle = ReturnType<typeof useSuggestion>;
