Console.WriteLine("FtEstimate");
