import { lazy } from "react";
import { createBrowserRouter, type RouteObject } from "react-router-dom";
import type { Recipe } from "#shared/contracts/recipes.ts";
import { NotFoundPage, ProblemPage } from "./shell/problem-page.tsx";
import { BareFrame, RootLayout } from "./shell/root-layout.tsx";
import { Skeleton } from "./ui/skeleton.tsx";

/** A page that loads with its route, by the name it is exported under. */
function page<Name extends string>(
  path: string,
  load: () => Promise<Record<Name, React.ComponentType>>,
  name: Name,
): RouteObject {
  return { path, lazy: async () => ({ Component: (await load())[name] }) };
}

const machines = () => import("./features/machines/machine-page.tsx");
const join = () => import("./features/applications/join-page.tsx");
/** Apart from the first page, so that a visitor does not load it. */
const OwnApplication = lazy(async () => {
  const { OwnApplication } = await import("./features/applications/own-application.tsx");
  return { default: OwnApplication };
});
const testCut = () => import("./features/test-cuts/new-test-cut-page.tsx");

/** Features do not know each other: a recipe's page is put together here. */
const recipePage: RouteObject = {
  path: "/recipes/:id",
  lazy: async () => {
    const [{ RecipePage }, { RecipeTestCuts }, { SharingPanel }] = await Promise.all([
      import("./features/recipes/recipe-page.tsx"),
      import("./features/test-cuts/recipe-test-cuts.tsx"),
      import("./features/sharing/sharing-panel.tsx"),
    ]);
    const testCuts = (recipe: Recipe) => <RecipeTestCuts recipe={recipe} />;
    const sharing = (recipe: Recipe) => <SharingPanel recipe={recipe} />;
    return { element: <RecipePage testCuts={testCuts} sharing={sharing} /> };
  },
};

/** The first page is the visitor's; whoever has no shop yet is told of their application on it. */
const homePage: RouteObject = {
  path: "/",
  lazy: async () => {
    const { HomePage } = await import("./features/home/home-page.tsx");
    return { element: <HomePage withoutShop={<OwnApplication />} /> };
  },
};

const pages: RouteObject[] = [
  homePage,
  page("/join", join, "JoinPage"),
  page("/join/received", join, "JoinReceivedPage"),
  page("/applications", () => import("./features/applications/application-list-page.tsx"), "ApplicationListPage"),
  page("/members", () => import("./features/members/member-list-page.tsx"), "MemberListPage"),
  page("/editions", () => import("./features/editions/edition-list-page.tsx"), "EditionListPage"),
  page("/recipes", () => import("./features/recipes/recipe-list-page.tsx"), "RecipeListPage"),
  page("/recipes/new", () => import("./features/recipes/new-recipe-page.tsx"), "NewRecipePage"),
  recipePage,
  page("/recipes/:id/edit", () => import("./features/recipes/edit-recipe-page.tsx"), "EditRecipePage"),
  page("/recipes/:id/compare", () => import("./features/recipes/compare-page.tsx"), "ComparePage"),
  page("/recipes/:id/test-cuts/new", testCut, "NewTestCutPage"),
  page("/test-cuts", () => import("./features/test-cuts/test-cut-list-page.tsx"), "TestCutListPage"),
  page("/machines", () => import("./features/machines/machine-list-page.tsx"), "MachineListPage"),
  page("/machines/new", machines, "NewMachinePage"),
  page("/machines/:id", machines, "MachinePage"),
  page("/peers", () => import("./features/peers/map-page.tsx"), "PeerMapPage"),
  page("/peers/book", () => import("./features/peers/book-page.tsx"), "BookAgainstPeersPage"),
  page("/peers/:groupId", () => import("./features/peers/group-page.tsx"), "PeerGroupPage"),
  page("/start", () => import("./features/starting-recipes/start-page.tsx"), "StartPage"),
  page("/method", () => import("./features/about/method-page.tsx"), "MethodPage"),
  page("/cautions", () => import("./features/about/cautions-page.tsx"), "CautionsPage"),
];

/** The route table: the only file that knows every feature. */
export function createRouter() {
  return createBrowserRouter([
    {
      element: <RootLayout />,
      hydrateFallbackElement: (
        <BareFrame>
          <Skeleton lines={8} />
        </BareFrame>
      ),
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
