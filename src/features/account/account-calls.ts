/** The calls to `/api/account`, and those for the files that one takes along. */
import {
  changeEmailSchema,
  changePasswordSchema,
  deleteAccountSchema,
  devicesResponseSchema,
  type ChangeEmail,
  type ChangePassword,
} from "../../../shared/schemas/account.ts";
import { apiFile, apiRequest } from "../../offline/index.ts";
import { checked } from "./checked.ts";

const call = (method: "POST" | "DELETE", path: string, body?: unknown) =>
  apiRequest(`/api/account${path}`, { method, body });

export const sendVerificationAgain = () => call("POST", "/verification");

export const changeEmail = async (typed: ChangeEmail) =>
  call("POST", "/email", checked(changeEmailSchema, typed));

export const changePassword = async (typed: ChangePassword) =>
  call("POST", "/password", checked(changePasswordSchema, typed));

export const readDevices = async () =>
  (await apiRequest("/api/account/devices", { schema: devicesResponseSchema })).devices;

export const endDevice = (id: string) => call("DELETE", `/devices/${encodeURIComponent(id)}`);
export const endOtherDevices = () => call("DELETE", "/devices");

export const deleteAccount = async (password: string) =>
  call("DELETE", "", checked(deleteAccountSchema, { password }));

export const exportEverything = () => apiFile("/api/export", "application/json");
export const exportChecks = () => apiFile("/api/export/checks.csv", "text/csv");
