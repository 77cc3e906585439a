import { createBrowserRouter, type RouteObject } from "react-router-dom";
import { NotFoundPage, ProblemPage } from "./shell/problem-page.tsx";
import { BareFrame, RootLayout } from "./shell/root-layout.tsx";

/** A page that loads with its route, by the name it is exported under. */
function page<Name extends string>(
  path: string,
  load: () => Promise<Record<Name, React.ComponentType>>,
  name: Name,
): RouteObject {
  return { path, lazy: async () => ({ Component: (await load())[name] }) };
}

const machines = () => import("./features/machines/machine-page.tsx");

const pages: RouteObject[] = [
  page("/machines", () => import("./features/machines/machine-list-page.tsx"), "MachineListPage"),
  page("/machines/new", machines, "NewMachinePage"),
  page("/machines/:id", machines, "MachinePage"),
];

/** The route table: the only file that knows every feature. */
export function createRouter() {
  return createBrowserRouter([
    {
      element: <RootLayout />,
      errorElement: (
        <BareFrame>
          <ProblemPage />
        </BareFrame>
      ),
      // Problems of a page stay inside the frame; the outer one is for a frame that has no session to fill it.
      children: [{ errorElement: <ProblemPage />, children: [...pages, { path: "*", element: <NotFoundPage /> }] }],
    },
  ]);
}
