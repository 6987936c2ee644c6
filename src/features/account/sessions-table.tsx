"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { formatUtc } from "@/components/quantity/format-time";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { endpoints } from "@/contracts/paths";
import type { SessionView } from "@/contracts/views";
import { deleteJson } from "@/features/query/fetch-json";
import { wordsOf } from "@/features/query/refused-error";

/** Where the person is signed in; any but this one can be ended from here. */
export function SessionsTable({ sessions }: { sessions: readonly SessionView[] }) {
  const router = useRouter();
  const end = useMutation({
    mutationFn: (id: string) => deleteJson(endpoints.oneSession(id)),
    onSuccess: () => router.refresh(),
  });
  return (
    <>
      <Table caption="Open sessions">
        <thead>
          <tr>
            <HeadCell>Browser</HeadCell>
            <HeadCell>Signed in, UTC</HeadCell>
            <HeadCell>Last seen, UTC</HeadCell>
            <HeadCell />
          </tr>
        </thead>
        <tbody>
          {sessions.map(({ id, browser, startedAt, lastSeenAt, current }) => (
            <Row key={id}>
              <Cell wholeRow>
                <span className="text-small [overflow-wrap:anywhere]">{browser || "unknown"}</span>
              </Cell>
              <Cell label="Signed in, UTC">{formatUtc(startedAt)}</Cell>
              <Cell label="Last seen, UTC">{formatUtc(lastSeenAt)}</Cell>
              <Cell>
                {current ? (
                  <span className="text-small text-ink-3">this one</span>
                ) : (
                  <Button kind="quiet" busy={end.isPending} onClick={() => end.mutate(id)}>
                    End
                  </Button>
                )}
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
      {end.isError && (
        <div className="mt-3">
          <Notice tone="error">{wordsOf(end.error)}</Notice>
        </div>
      )}
    </>
  );
}
