import { useNavigate } from "react-router-dom";
import { TextLink } from "@/components/ui/text-link.tsx";
import { RegisterForm } from "@/features/sign-in/components/register-form.tsx";
import { usePageTitle } from "@/lib/page-title.ts";
import { paths } from "../paths.ts";

export function RegisterPage() {
  usePageTitle("Register your shop");
  const navigate = useNavigate();
  return (
    <>
      <h1 className="font-serif text-2xl font-bold text-ink">Register your shop</h1>
      <p className="mt-2 mb-6 text-base text-graphite">You own the shop and invite the others from its Team page.</p>
      <RegisterForm onOpened={(shop) => void navigate(paths.bench(shop), { replace: true })} />
      <p className="mt-8 text-base">
        Registered already? <TextLink to={paths.signIn()}>Sign in</TextLink>
      </p>
    </>
  );
}
