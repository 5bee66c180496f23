namespace Bittern.Language;
