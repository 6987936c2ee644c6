"use client";

import { useId, useState } from "react";
import { Button } from "@/components/button/button";
import { fieldBox } from "@/components/line/field-tone";
import { componentList, findComponent, searchComponents } from "@/contracts/component-list";

/** Adds a component by name, formula, short name or CAS number; the browser's own list helps while typing. */
export function AddComponent({ present, onAdd }: { present: readonly string[]; onAdd: (id: string) => void }) {
  const [text, setText] = useState("");
  const [told, setTold] = useState<string | null>(null);
  const listId = useId();
  const inputId = useId();

  const add = () => {
    const nearest = searchComponents(text);
    const found = findComponent(text) ?? (nearest.length === 1 ? nearest[0] : undefined);
    if (!found) {
      setTold(
        text.trim() === ""
          ? "Type a name, a formula or a CAS number."
          : nearest.length > 1
            ? `“${text}” fits several: ${nearest
                .slice(0, 4)
                .map(({ name }) => name)
                .join(", ")}. Type more of the name.`
            : `No component of the library is called “${text}”.`,
      );
      return;
    }
    if (present.includes(found.id)) {
      setTold(`${found.name} is in the table already.`);
      return;
    }
    onAdd(found.id);
    setText("");
    setTold(null);
  };

  return (
    <div className="flex flex-wrap items-center gap-3">
      <label htmlFor={inputId} className="sr-only">
        Component to add, by name, formula or CAS number
      </label>
      <div className={`${fieldBox.rest} w-[240px]`}>
        <input
          id={inputId}
          list={listId}
          className="field-value words"
          placeholder="name, formula or CAS"
          autoComplete="off"
          value={text}
          onChange={(event) => {
            setText(event.target.value);
            setTold(null);
          }}
          onKeyDown={(event) => {
            if (event.key !== "Enter") return;
            event.preventDefault();
            add();
          }}
        />
      </div>
      <datalist id={listId}>
        {componentList.map(({ id, name, formula, cas }) => (
          <option key={id} value={name}>{`${formula}, ${cas}`}</option>
        ))}
      </datalist>
      <Button onClick={add}>Add a component</Button>
      <span role="status" className="text-small text-beyond">
        {told}
      </span>
    </div>
  );
}
