import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { partBySlug } from "@/contracts/lines/parts";
import { PartForm } from "@/features/screening/form/part-form";
import { requireViewer } from "@/server/auth/viewer";
import { FluidOfDraft } from "../fluid-of-draft";

type Props = { params: Promise<{ screeningId: string; part: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: partBySlug((await params).part)?.title ?? "Lines" };
}

export default async function PartPage({ params }: Props) {
  await requireViewer();
  const part = partBySlug((await params).part);
  if (!part) notFound();
  return <PartForm slug={part.slug} below={part.slug === "fluid" && <FluidOfDraft />} />;
}
