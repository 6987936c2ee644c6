import { redirect } from "next/navigation";
import { pages } from "@/contracts/paths";
import { currentViewer } from "@/server/auth/viewer";

export default async function HomePage() {
  redirect((await currentViewer()) ? pages.desk : pages.signIn);
}
