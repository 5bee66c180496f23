namespace Bittern.Engine;
