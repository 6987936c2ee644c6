"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { endpoints } from "@/contracts/paths";
import type { ChangePerson } from "@/contracts/requests";
import type { PersonDetailView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";

/** One change to a person; the page is drawn anew once the server has it. */
export function useChangePerson(personId: string) {
  const router = useRouter();
  return useMutation({
    mutationFn: (body: ChangePerson) => postJson<PersonDetailView>(endpoints.person(personId), body),
    onSuccess: () => router.refresh(),
  });
}
