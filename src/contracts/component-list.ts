/**
 * Names of the component library for search and tables in the browser, which must not load the library with all its constants.
 * component-list.test.ts holds it against the library.
 */
export type ListedComponent = { id: string; name: string; formula: string; cas: string };

export const componentList: readonly ListedComponent[] = [
  { id: "methane", name: "Methane", formula: "CH4", cas: "74-82-8" },
  { id: "ethane", name: "Ethane", formula: "C2H6", cas: "74-84-0" },
  { id: "propane", name: "Propane", formula: "C3H8", cas: "74-98-6" },
  { id: "isobutane", name: "Isobutane", formula: "C4H10", cas: "75-28-5" },
  { id: "n_butane", name: "n-Butane", formula: "C4H10", cas: "106-97-8" },
  { id: "neopentane", name: "Neopentane", formula: "C5H12", cas: "463-82-1" },
  { id: "isopentane", name: "Isopentane", formula: "C5H12", cas: "78-78-4" },
  { id: "n_pentane", name: "n-Pentane", formula: "C5H12", cas: "109-66-0" },
  { id: "n_hexane", name: "n-Hexane", formula: "C6H14", cas: "110-54-3" },
  { id: "n_heptane", name: "n-Heptane", formula: "C7H16", cas: "142-82-5" },
  { id: "n_octane", name: "n-Octane", formula: "C8H18", cas: "111-65-9" },
  { id: "n_nonane", name: "n-Nonane", formula: "C9H20", cas: "111-84-2" },
  { id: "n_decane", name: "n-Decane", formula: "C10H22", cas: "124-18-5" },
  { id: "n_undecane", name: "n-Undecane", formula: "C11H24", cas: "1120-21-4" },
  { id: "n_dodecane", name: "n-Dodecane", formula: "C12H26", cas: "112-40-3" },
  { id: "cyclopentane", name: "Cyclopentane", formula: "C5H10", cas: "287-92-3" },
  { id: "cyclohexane", name: "Cyclohexane", formula: "C6H12", cas: "110-82-7" },
  { id: "methylcyclohexane", name: "Methylcyclohexane", formula: "C7H14", cas: "108-87-2" },
  { id: "ethylene", name: "Ethylene", formula: "C2H4", cas: "74-85-1" },
  { id: "propylene", name: "Propylene", formula: "C3H6", cas: "115-07-1" },
  { id: "1_butene", name: "1-Butene", formula: "C4H8", cas: "106-98-9" },
  { id: "1_3_butadiene", name: "1,3-Butadiene", formula: "C4H6", cas: "106-99-0" },
  { id: "acetylene", name: "Acetylene", formula: "C2H2", cas: "74-86-2" },
  { id: "benzene", name: "Benzene", formula: "C6H6", cas: "71-43-2" },
  { id: "toluene", name: "Toluene", formula: "C7H8", cas: "108-88-3" },
  { id: "ethylbenzene", name: "Ethylbenzene", formula: "C8H10", cas: "100-41-4" },
  { id: "o_xylene", name: "o-Xylene", formula: "C8H10", cas: "95-47-6" },
  { id: "m_xylene", name: "m-Xylene", formula: "C8H10", cas: "108-38-3" },
  { id: "p_xylene", name: "p-Xylene", formula: "C8H10", cas: "106-42-3" },
  { id: "methanol", name: "Methanol", formula: "CH4O", cas: "67-56-1" },
  { id: "dimethyl_ether", name: "Dimethyl ether", formula: "C2H6O", cas: "115-10-6" },
  { id: "ethylene_oxide", name: "Ethylene oxide", formula: "C2H4O", cas: "75-21-8" },
  { id: "vinyl_chloride", name: "Vinyl chloride", formula: "C2H3Cl", cas: "75-01-4" },
  { id: "hydrogen", name: "Hydrogen", formula: "H2", cas: "1333-74-0" },
  { id: "helium", name: "Helium", formula: "He", cas: "7440-59-7" },
  { id: "nitrogen", name: "Nitrogen", formula: "N2", cas: "7727-37-9" },
  { id: "oxygen", name: "Oxygen", formula: "O2", cas: "7782-44-7" },
  { id: "argon", name: "Argon", formula: "Ar", cas: "7440-37-1" },
  { id: "carbon_monoxide", name: "Carbon monoxide", formula: "CO", cas: "630-08-0" },
  { id: "carbon_dioxide", name: "Carbon dioxide", formula: "CO2", cas: "124-38-9" },
  { id: "hydrogen_sulfide", name: "Hydrogen sulfide", formula: "H2S", cas: "7783-06-4" },
  { id: "sulfur_dioxide", name: "Sulfur dioxide", formula: "SO2", cas: "7446-09-5" },
  { id: "ammonia", name: "Ammonia", formula: "NH3", cas: "7664-41-7" },
  { id: "chlorine", name: "Chlorine", formula: "Cl2", cas: "7782-50-5" },
  { id: "hydrogen_chloride", name: "Hydrogen chloride", formula: "HCl", cas: "7647-01-0" },
  { id: "water", name: "Water", formula: "H2O", cas: "7732-18-5" },
  { id: "r134a", name: "R134a (1,1,1,2-tetrafluoroethane)", formula: "C2H2F4", cas: "811-97-2" },
  { id: "mtbe", name: "MTBE (methyl tert-butyl ether)", formula: "C5H12O", cas: "1634-04-4" },
];

const byId = new Map(componentList.map((component) => [component.id, component]));

/** The name people read; an id that the list does not know stands for itself. */
export const componentName = (id: string): string => byId.get(id)?.name ?? id.replaceAll("_", " ");

const bare = (text: string) => text.toLowerCase().replace(/[\s\-_,.()]/g, "");

/** Names people write that the list does not carry itself. */
const alsoWritten: Record<string, string> = {
  c1: "methane",
  c2: "ethane",
  c3: "propane",
  ic4: "isobutane",
  nc4: "n_butane",
  c4: "n_butane",
  ic5: "isopentane",
  nc5: "n_pentane",
  c5: "n_pentane",
  nc6: "n_hexane",
  c6: "n_hexane",
  nc7: "n_heptane",
  nc8: "n_octane",
  nc9: "n_nonane",
  nc10: "n_decane",
  butane: "n_butane",
  pentane: "n_pentane",
  hexane: "n_hexane",
  heptane: "n_heptane",
  octane: "n_octane",
  ibutane: "isobutane",
  ipentane: "isopentane",
  ethene: "ethylene",
  propene: "propylene",
  hydrogensulphide: "hydrogen_sulfide",
  sulphurdioxide: "sulfur_dioxide",
  h2s: "hydrogen_sulfide",
  co2: "carbon_dioxide",
  co: "carbon_monoxide",
  n2: "nitrogen",
  o2: "oxygen",
  h2: "hydrogen",
  he: "helium",
  ar: "argon",
  nh3: "ammonia",
  h2o: "water",
};

/** The one component that a name, formula, CAS number or common short name means; undefined when none or several do. */
export function findComponent(written: string): ListedComponent | undefined {
  const wanted = bare(written);
  if (wanted === "") return undefined;
  const also = alsoWritten[wanted];
  if (also) return byId.get(also);
  const exact = componentList.filter(({ id, name, cas }) => [id, name, cas].some((text) => bare(text) === wanted));
  if (exact.length === 1) return exact[0];
  const byFormula = componentList.filter(({ formula }) => bare(formula) === wanted);
  return byFormula.length === 1 ? byFormula[0] : undefined;
}

/** Components whose name, formula or CAS number contains what was typed, best first. */
export function searchComponents(written: string): ListedComponent[] {
  const wanted = bare(written);
  const known = findComponent(written);
  const containing = componentList.filter(({ id, name, formula, cas }) =>
    [id, name, formula, cas].some((text) => bare(text).includes(wanted)),
  );
  return known ? [known, ...containing.filter((component) => component !== known)] : containing;
}
