import { Sheet, SheetBody } from "@/components/shell/sheet";
import { WaitingLines } from "@/components/states/waiting";

export default function Loading() {
  return (
    <Sheet>
      <SheetBody>
        <WaitingLines lines={8} />
      </SheetBody>
    </Sheet>
  );
}
