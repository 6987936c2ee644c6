import "server-only";
import { section } from "@db/schema/app/section";
import type { CreateSection } from "@/contracts/requests";
import type { SectionView } from "@/contracts/views";
import { authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { alreadyExists } from "@/server/database-refusal";
import { writing } from "@/server/reading";
import { getSection } from "./read";

/** Adds an isolatable section to a facility of the viewer. Tags are unique within a facility. */
export async function createSection(viewer: Viewer, { facilityId, tag, name, description }: CreateSection): Promise<SectionView> {
  authorise(viewer, "section.create", { facilityId });
  const [made] = await writing(viewer, (transaction) =>
    transaction
      .insert(section)
      .values({ facilityId, tag, name, description, createdBy: viewer.id })
      .returning({ id: section.id }),
  ).catch(alreadyExists("section_tag_in_facility", "tag", `Section ${tag} is there already. Open it, or choose another tag.`));
  const view = made && (await getSection(viewer, made.id));
  if (!view) throw new Error("the section that was just made can't be read");
  const { screenings: _, ...rest } = view;
  return rest;
}
