namespace LoadWatch.Storage.Internal; internal static class Placeholder { }
