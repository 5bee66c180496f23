namespace Bittern.HookApi;
