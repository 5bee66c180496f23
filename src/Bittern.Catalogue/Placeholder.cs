namespace Bittern.Catalogue;
